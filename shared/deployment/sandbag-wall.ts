import type { LineSection } from '../calc/line/line-sections'
import { assertInRange } from '../errors'

/** Exact: the international foot [m]. */
const FOOT = 0.3048

/** Source of everything about sandbags. */
export const SANDBAG_SOURCE = {
  source: 'NDSU Extension AE-626, Sandbagging for Flood Protection',
  edition: '2011',
  /** Heights that its table gives [m]: 1 to 4 ft. */
  tabled: { min: FOOT, max: 4 * FOOT },
  /** Above the crest [m]: 1 ft. */
  freeboard: FOOT,
  bagsPerPersonHour: 12,
  /** Filled, 35 to 40 lb [kg]. */
  bagMass: { min: 35 * 0.45359237, max: 40 * 0.45359237 },
} as const

/**
 * Sandbags for a dike of a height, per metre of its length: N = (3H + 9H²)/2 per ft, H in ft.
 *
 * @param height [m], 0 to 3; the source tables 1 to 4 ft.
 * @throws OutOfRangeError
 * @see NDSU Extension AE-626, Sandbagging for Flood Protection, 2011 edition; the 1997 edition gives
 * other figures.
 */
export function sandbagsPerMetre(height: number): number {
  assertInRange('height', height, { min: 0, max: 3, unit: 'm' })
  const feet = height / FOOT
  return (3 * feet + 9 * feet ** 2) / 2 / FOOT
}

export interface SandbagWall {
  readonly bags: number
  /** 12 bags filled and laid in an hour by one person [person-h × 3600 s]. */
  readonly personTime: number
  /** Sand and bags at 35 to 40 lb each [kg]. */
  readonly mass: { readonly min: number; readonly max: number }
  /** Length that a dike is needed on [m]. */
  readonly length: number
  readonly highest: number
  /** Some of it is lower or higher than the source tables. */
  readonly isBeyondTable: boolean
}

/** A dike higher than this is not counted in bags [m]. */
const HIGHEST = 3

/**
 * The sandbag dike in place of a line: one foot above the level, each piece of a section at its own
 * lowest ground.
 *
 * @param level That is checked [m].
 * @returns null where the dike would be higher than 3 m, which the source does not speak of.
 */
export function sandbagWall(sections: readonly LineSection[], level: number): SandbagWall | null {
  const parts = sections
    .flatMap(({ pieces }) => pieces)
    .map(({ from, to, lowestGround }) => ({
      length: to - from,
      height: level - lowestGround + SANDBAG_SOURCE.freeboard,
    }))
    .filter(({ height }) => height > 0)
  const heights = parts.map(({ height }) => height)
  const highest = Math.max(0, ...heights)
  if (highest > HIGHEST) return null
  const exact = parts.reduce((all, part) => all + part.length * sandbagsPerMetre(part.height), 0)
  // 1e-9: what binary arithmetic adds to a whole number of bags.
  const bags = Math.ceil(Math.max(0, exact - 1e-9))
  const { bagMass, bagsPerPersonHour, tabled } = SANDBAG_SOURCE
  return {
    bags,
    personTime: (bags / bagsPerPersonHour) * 3600,
    mass: { min: bags * bagMass.min, max: bags * bagMass.max },
    length: parts.reduce((sum, { length }) => sum + length, 0),
    highest,
    isBeyondTable: heights.some((height) => height < tabled.min || height > tabled.max),
  }
}
