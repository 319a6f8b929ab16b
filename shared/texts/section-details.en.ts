/** Texts of what a cross-section shows once it is opened: the sums behind a check. */
export const sectionDetailsTexts = {
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
    softGround: 'soft ground bears no more than',
  },
} as const

/** They are loaded with the first part that needs them. */
export const sectionDetails = { en: { sectionDetails: sectionDetailsTexts } } as const
