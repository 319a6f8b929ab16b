import { loadedShape, type LoadedShapeInput } from '../loaded-shape/loaded-shape'
import { findRoot } from '../numerics/find-root'

/** What the tube must still do at the least pressure. */
export interface AirDemand extends Omit<LoadedShapeInput, 'airPressure'> {
  /** Freeboard above still water: required freeboard, waves and velocity head [m]. */
  readonly freeboard: number
}

export interface MinimumAirPressure {
  /** Pressure whose crest gives the freeboard [Pa]; null: none up to 100 kPa does. */
  readonly forCrest: number | null
  /** Pressure that keeps the seat closed, ρ g h [Pa]. */
  readonly forSeal: number
  /** The larger of the two [Pa]; null: no pressure is enough. */
  readonly least: number | null
}

/** Range of air pressure in which the answer is looked for [Pa]. */
const LOWEST = 1
const HIGHEST = 100_000

/**
 * Least air pressure of a tube: the larger of that whose loaded crest gives the freeboard and ρ g h,
 * which keeps the seat closed.
 *
 * The crest rises with the pressure, so one root is looked for between 1 Pa and 100 kPa.
 */
export function minimumAirPressure(demand: AirDemand): MinimumAirPressure {
  const { freeboard, ...tube } = demand
  const forSeal = tube.unitWeight * tube.depth
  const spare = (airPressure: number): number => {
    const shape = loadedShape({ ...tube, airPressure })
    return shape.solved ? shape.crest - tube.depth - freeboard : -tube.diameter
  }

  const atHigh = spare(HIGHEST)
  if (atHigh < 0) return { forCrest: null, forSeal, least: null }
  const atLow = spare(LOWEST)
  const forCrest =
    atLow >= 0 ? LOWEST : findRoot(spare, { low: LOWEST, high: HIGHEST, atLow, atHigh }, 1e-14)
  return { forCrest, forSeal, least: Math.max(forCrest, forSeal) }
}
