import { sectionPartTexts } from './section-parts.en'

/** Texts of what a cross-section shows once it is opened, and of what its picture says. */
export const sectionDetailsTexts = {
  part: sectionPartTexts,
  caption: {
    datum: 'Levels above {datum}.',
    restsOn:
      'Rests on: tube {diameter}, skirt {skirt}, {mass}, air {air}, sections of {length}; {surface}, friction {friction}, {edge}; check basis “{basis}”{loads}.',
    holdsOnlyIf:
      'Holds only if the tube keeps {air} of air, the skirt lies flat and finds the friction {friction} on firm ground of this kind, the water under it is as assumed ({edge}), and {dry}.',
    standsOnlyIf:
      'These figures stand only if the tube keeps {air} of air, the skirt lies flat and finds the friction {friction} on firm ground of this kind, the water under it is as assumed ({edge}), and {dry}.',
    dryNone: 'no water stands on the dry side',
    drySome: 'no more than {depth} of water stands on the dry side',
    made: 'Toehold {version}, Quick check, {date}.',
  },
  sums: {
    caption: 'To add up by hand: {check}',
    demand: 'What drives',
    resistance: 'What holds',
    combination: 'Combination {which} of EN 1997-1, the worse one here',
    sum: 'Sum',
    figure: '{value}',
    term: {
      still: 'Still water',
      current: 'Current',
      wave: 'Waves',
      debris: 'Floating debris',
      dry: 'Water on the dry side, pushing back',
      skirtWater: 'Water over the skirt',
      onSkirt: 'Water over the skirt, less the lift of the tube',
      self: 'Own weight',
      lift: 'Lift of the tube by the water on the wet side',
      dryLift: 'Lift of the tube by the water on the dry side',
      uplift: 'Water under the skirt',
      loads: 'Loads, lifting off on the slope',
      grip: 'Friction under the skirt that stays flat',
    },
    cos: 'cos β',
    sin: 'sin β',
    slope: 'β is the crossfall: tan β = {fall}, cos β {cos}, sin β {sin}.',
    friction: 'times friction {friction}',
    frictionPartial: 'times friction {friction} / {factor}',
    over: 'divided by {factor}',
    softGround: 'soft ground bears no more, the less of c_u B and 0.4 N',
  },
} as const

/** They are loaded with the first part that needs them. */
export const sectionDetails = { en: { sectionDetails: sectionDetailsTexts } } as const
