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
} as const
