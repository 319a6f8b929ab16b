/** Texts of the Method page. Formulas, sources and check values are data in shared/method and shared/verification. */
export const methodTexts = {
  title: 'Method',
  lead: 'What the program computes, by which formula, from which source and under which assumption, and what it does not cover.',
  contents: 'On this page',
  cautions: {
    title: 'Before you rely on a figure',
    guarantee:
      'A design check, not a guarantee. It looks at one cross-section at a time, at rest, with the figures that were entered.',
    codes:
      'Local codes, the barrier’s own instructions and a licensed engineer’s judgement come first. Somebody who may sign for it must look at the site.',
    leave:
      'Leave before the water reaches the leave level. It lies below the level that holds, by what the water rises while the area is cleared and by 0.05 m at least, because nothing here knows when the last person goes.',
    people:
      'Nobody on the wet side, or close behind a loaded barrier without a way out: when a section gives way, the water behind it comes at once.',
    ground:
      'No set-up on loose gravel or bare mud. There the check fails whatever the figures say, because the skirt neither grips nor seals.',
    power:
      'Electric pumps and blowers near water need earth-fault protection; fuel engines outdoors only.',
    friction:
      'No published friction exists for a coated skirt on wet turf, asphalt or concrete. The values that come with the program are judgement, unverified: pull the skirt over the site and enter what you measured.',
    edge: 'No published figure says how much of the head reaches the edge of such a skirt. Uplift, friction and check basis decide the answer: look at what each would change.',
    sealed:
      'An open edge over a sealed seat is the adverse limit: the full head then stands under skirt and tube, and nothing holds.',
  },
  conventions: {
    title: 'Conventions',
    section:
      'A vertical cross-section, per metre run. Water comes from the left; x runs to the dry side and y up, from the weld line, where the skirt meets the tube, at ground level.',
    units:
      'SI base units inside; units are converted once, on the way in and on the way out. Formulas and worked figures on this page are in SI.',
    limits:
      'A failed check is a result. A figure outside its range is an error that names field, value, range and unit; nothing is repaired silently.',
    example:
      'Each worked figure is computed by the engine when this page opens, from the figures given beside it. What they leave out is that of the example: tube {diameter} m, skirt {skirt} m, contact strip {strip} m, {mass} kg/m, {pressure} kPa, friction {friction}, {depth} m of water, an open edge with uplift that falls evenly, 1000 kg/m³, 9.81 m/s².',
    tags: 'Each source carries a word: published, the text was seen; from memory, it was recalled and not seen; derived, worked out here and confirmed by another route; common practice, no source.',
  },
  tags: {
    published: 'published',
    memory: 'from memory',
    derived: 'derived',
    practice: 'common practice',
  },
  formula: {
    worked: 'Worked figure:',
    gives: 'gives',
    failed: 'nothing: the engine refused',
    source: 'Source: {source}.',
  },
  bases: {
    title: 'Required factors',
    basis: 'Basis',
    sliding: 'Sliding, skirt',
    overturning: 'Overturning',
    flotation: 'Flotation',
    fabric: 'Fabric',
    source: 'Source and edition',
    none: 'not checked',
  },
  chart: {
    title: 'Design chart: how far the crest comes down',
    intro:
      'Crest over diameter against depth over diameter, for seven air pressures. Every tube of any size lies on it. A curve ends where no shape stands any more.',
    caseFromAddress: 'The bold curve is the case in the address of this page.',
    caseDefault:
      'The bold curve is the case with which the Quick check opens. Come here from the Quick check, and it is yours.',
    caseRefused:
      'The case in the address has a figure that the Quick check refuses, so that none is marked.',
    tick: '{value}',
    curve: '{ratio}',
    depthAxis: 'depth over diameter, h/D',
    crestAxis: 'crest over diameter',
    ratioAxis: 'p/(ρgD)',
    limit: 'water over the crest',
    present: 'p/(ρgD) {ratio}: crest/D {crest} at h/D {depth}',
    fallen: 'p/(ρgD) {ratio}: no shape stands at h/D {depth}',
    describe:
      'Curves of the loaded crest over the diameter, from 1 without water falling as the water rises, lower for lower air pressure; each ends on the line where the water reaches the crest, or before.',
    saveAs: 'Save the chart',
    svg: 'SVG',
    png: 'PNG',
    csv: 'CSV',
    notSaved: 'Not saved: the browser refused.',
    figures: 'The figures behind the chart',
    depth: 'h/D',
    largest: 'largest h/D',
    note: 'A skirt long enough not to be the reason is assumed. No figure: no shape stands.',
    column: 'p/(ρgD) {ratio}',
  },
  values: {
    title: 'Check values, recomputed now',
    intro:
      'Figures from outside the program, each recomputed in this page by the functions that the checks use. A figure passes when it rounds to the printed one. The tests run the same rows.',
    count:
      '{published} published, {memory} from memory, {derived} derived, {practice} common practice',
    allPass: 'All pass.',
    somePass: 'Not all pass: {rows}.',
    at: 'Computed at {time} in {duration} ms.',
    again: 'Compute again',
    figure: 'Figure',
    printed: 'Printed',
    computed: 'Computed',
    difference: 'Difference',
    result: 'Result',
    pass: 'pass',
    fail: 'fail',
    references: 'Reference only',
    referencesIntro:
      'Values of the trade that the program does not compute. They are not counted above; tests recompute those that close.',
    topics: {
      hydrostatics: 'Hydrostatics',
      stability: 'Stability with uplift',
      movingWater: 'Moving water',
      loadedTube: 'Loaded tube',
      ground: 'Ground',
      water: 'Water, rain, weirs',
      pumps: 'Pumps',
      sandbags: 'Sandbags',
      chance: 'Chance',
      sheets: 'Sheets and checking',
    },
  },
} as const
