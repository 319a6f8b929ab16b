/** A gap between skirt and ground, such as a crease. */
export interface SkirtGap {
  /** Height of the gap, w [m]. */
  readonly width: number
  /** Difference of head across the skirt [m]. */
  readonly head: number
  /** Length of the way under the skirt [m]. */
  readonly path: number
  /** Kinematic viscosity of the water, ν [m²/s]. */
  readonly viscosity: number
  readonly gravity: number
}

export interface GapFlow {
  /** Flow per metre of gap: the smaller of both [m²/s]. */
  readonly perMetre: number
  readonly laminar: number
  readonly orifice: number
  /** q/ν of the laminar flow [–]. */
  readonly reynolds: number
}

/** Discharge coefficient of a sharp slot. */
const SLOT_COEFFICIENT = 0.61

/**
 * Flow through a gap under the skirt, per metre of gap: laminar between plates, limited by the slot:
 *
 *     q = min( g w³ i / 12 ν,  0.61 w √(2 g h) ),   i = h / path
 *
 * One millimetre of crease matters: the laminar flow grows with its cube.
 *
 * @see White, Fluid Mechanics, ch. 6, laminar flow between parallel plates.
 */
export function gapFlow({ width, head, path, viscosity, gravity }: SkirtGap): GapFlow {
  const drop = Math.max(0, head)
  const laminar = (gravity * width ** 3 * (drop / path)) / (12 * viscosity)
  const orifice = SLOT_COEFFICIENT * width * Math.sqrt(2 * gravity * drop)
  return {
    perMetre: Math.min(laminar, orifice),
    laminar,
    orifice,
    reynolds: laminar / viscosity,
  }
}
