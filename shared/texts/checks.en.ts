/** Names of checks, verdicts, bases, grounds and models. */
export const checksTexts = {
  name: {
    sliding: 'Sliding',
    overturning: 'Overturning',
    flotation: 'Flotation',
    skirt: 'Skirt pull',
    freeboard: 'Freeboard',
    fabric: 'Fabric',
    ground: 'Ground',
  },
  /** "…, then {verb}": what happens beyond the level that holds. */
  then: {
    sliding: 'slides',
    overturning: 'tips over',
    flotation: 'floats up',
    skirt: 'rolls as its skirt lets go',
    freeboard: 'has too little freeboard',
    fabric: 'strains its fabric',
    ground: 'stands on unsuitable ground',
  },
  verdict: {
    holds: 'Holds',
    narrow: 'Holds narrowly',
    fails: 'Does not hold',
    notChecked: 'Not checked',
  },
  /** One check alone: it never says that the barrier holds. */
  state: {
    holds: 'enough',
    narrow: 'barely enough',
    fails: 'not enough',
    notChecked: 'not checked',
    noHelp: 'no help without a skirt',
  },
  /** What the check asks. */
  asks: {
    sliding: 'Does the water push the barrier away over the ground?',
    overturning:
      'Does it tip over its dry toe? A limp skirt carries no moment, so this seldom governs; rolling is checked by the skirt pull.',
    flotation: 'Does the water under the skirt lift more than stands on it?',
    skirt:
      'Does the part of the skirt that stays flat hold the tube back, or does the tube roll up its skirt?',
    freeboard: 'Is the crest of the loaded tube far enough above the water?',
    fabric: 'Does the fabric carry the pull in the skin?',
    ground: 'May a barrier stand on this surface at all?',
  },
  basis: {
    'global-1-5': 'Factor 1.5 throughout',
    usual: 'Usual load case, 1.5',
    unusual: 'Unusual load case, 1.3',
    extreme: 'Extreme load case, 1.1',
    'partial-ec7': 'Partial factors, EN 1997-1',
  },
  ground: {
    turf: 'Turf, mown and firm',
    concrete: 'Concrete',
    asphalt: 'Asphalt',
    'loose-gravel': 'Loose gravel',
    'bare-mud': 'Bare mud',
    own: 'Another surface',
  },
  tag: {
    seen: 'read in the source',
    memory: 'recalled, to be confirmed in the source',
    derived: 'derived here',
    practice: 'common practice',
    judgement: 'engineering judgement',
  },
  upliftModel: {
    linear: 'Falls evenly to the dry toe',
    deep: 'Deep uniform sand',
    developing: 'Grows with time',
    none: 'None (sealed seat)',
  },
} as const
