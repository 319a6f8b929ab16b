/** Something that everybody has an idea of. */
export interface Everyday {
  readonly id: 'bag' | 'person' | 'piano' | 'cow' | 'car' | 'elephant'
  /** A round mass [kg]. Common practice, no source. */
  readonly mass: number
}

/** From light to heavy. */
const EVERYDAY: readonly Everyday[] = [
  { id: 'bag', mass: 20 },
  { id: 'person', mass: 75 },
  { id: 'piano', mass: 250 },
  { id: 'cow', mass: 600 },
  { id: 'car', mass: 1200 },
  { id: 'elephant', mass: 4000 },
]

/** A mass as so many of something. */
export interface Comparison {
  readonly thing: Everyday
  readonly count: number
}

/** The heaviest thing of which there is at least one; null below the lightest. */
export function comparisonFor(mass: number): Comparison | null {
  const thing = EVERYDAY.filter((candidate) => candidate.mass <= mass).at(-1)
  return thing ? { thing, count: mass / thing.mass } : null
}

/** A bath tub, filled [m³], and somebody on a bicycle [m/s]. Common practice, no source. */
export const BATHTUB = 0.15
export const CYCLIST = 5
