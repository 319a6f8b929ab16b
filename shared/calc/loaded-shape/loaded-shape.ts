import { FILM } from '../../constants'
import { findRoot } from '../numerics/find-root'
import { freeSkirt } from './free-skirt'
import { contactWidthOf, lengthResidual } from './skin-length'
import type { Membrane } from './membrane'
import { weldHeight } from './weld-height'

/** An air-filled tube with its skirt, and the water in front of it. */
export interface LoadedShapeInput {
  /** Diameter of the unloaded tube, D [m]. */
  readonly diameter: number
  /** Air pressure above atmosphere, p [Pa]. */
  readonly airPressure: number
  /** Skirt on which water stands, L_w [m]. */
  readonly wettedSkirt: number
  /** Depth of water, h [m], 0 or more. */
  readonly depth: number
  /** ρ g [N/m³]. */
  readonly unitWeight: number
}

/** The tube as it stands. */
export interface StandingShape {
  readonly solved: true
  /** Height of the crest above the ground, 2T/p [m]. */
  readonly crest: number
  /** Width on which the tube rests [m]. */
  readonly contact: number
  /** Tension of the skin, T [N/m]. */
  readonly skinTension: number
  /** Pull of the skirt, ρ g h²/2 [N/m]. */
  readonly skirtTension: number
  /** Height of the weld line above the ground [m]. */
  readonly weldHeight: number
  /** Length of skirt that is lifted off the ground [m]. */
  readonly freeSkirt: number
}

/** Why there is no shape: no skirt, water over the crest, or the tube gives way. */
export type FailureReason = 'no-skirt' | 'overtopped' | 'gives-way'

export interface FallenShape {
  readonly solved: false
  readonly reason: FailureReason
}

export type LoadedShape = StandingShape | FallenShape

/**
 * p/(ρ g D) from which the branch of shapes ends where the water reaches the crest; below, it ends
 * at a fold before that. Derived numerically, four digits.
 */
export const FOLD_PRESSURE_RATIO = 0.463

/** Where the search for the weld height begins, in depths: near the answer of a firm tube. */
const WELD_START = 0.12

/** Contact may come out this much below zero by rounding, in diameters. */
const CONTACT_NOISE = 1e-12

/**
 * The shape in which the tube stands under load.
 *
 * One unknown is eliminated: for a crest H = 2r the weld balance has one root; what remains is the
 * length of the skin, which rises with H. A root is bracketed between the water surface and the
 * diameter before it is searched, so the search cannot leave the branch, and where there is no
 * bracket there is no shape.
 *
 * @remarks Level ground, no water on the dry side. Depth 0 gives the unloaded circle.
 */
export function loadedShape(input: LoadedShapeInput): LoadedShape {
  const { diameter, airPressure, wettedSkirt, depth, unitWeight } = input
  if (wettedSkirt === 0 && depth > 0) return { solved: false, reason: 'no-skirt' }
  if (depth < FILM) return unloaded(diameter, airPressure)
  if (depth >= diameter) return { solved: false, reason: 'overtopped' }

  const membrane: Membrane = {
    depth,
    perimeter: Math.PI * diameter,
    kappa: unitWeight / (2 * airPressure),
  }
  const endsAtFold = airPressure < FOLD_PRESSURE_RATIO * unitWeight * diameter
  const radius = standingRadius(membrane, diameter / 2, endsAtFold)
  if (radius === null) return { solved: false, reason: endsAtFold ? 'gives-way' : 'overtopped' }

  const weld = weldHeight(membrane, radius, WELD_START * depth)
  const contact = contactWidthOf(membrane, radius, weld)
  const lifted = freeSkirt(depth, weld).length
  if (contact <= -CONTACT_NOISE * diameter || lifted >= wettedSkirt) {
    return { solved: false, reason: 'gives-way' }
  }
  return {
    solved: true,
    crest: 2 * radius,
    contact,
    skinTension: airPressure * radius,
    skirtTension: (unitWeight * depth ** 2) / 2,
    weldHeight: weld,
    freeSkirt: lifted,
  }
}

function unloaded(diameter: number, airPressure: number): StandingShape {
  return {
    solved: true,
    crest: diameter,
    contact: 0,
    skinTension: (airPressure * diameter) / 2,
    skirtTension: 0,
    weldHeight: 0,
    freeSkirt: 0,
  }
}

/** Radius of the highest standing shape, between half the depth and half the diameter; null: none. */
function standingRadius(membrane: Membrane, largest: number, endsAtFold: boolean): number | null {
  const { depth, kappa } = membrane
  const residual = residualByRadius(membrane)
  const atHigh = residual(largest)
  if (atHigh <= 0) return largest

  // Two skin tensions must be able to carry the pull of the skirt, 2T > T_s.
  const least = (kappa * depth ** 2) / 2
  const atSurface = least < depth / 2 ? residual(depth / 2) : Infinity
  if (atSurface < 0) {
    return findRoot(residual, { low: depth / 2, high: largest, atLow: atSurface, atHigh })
  }
  if (!endsAtFold) return null
  const low = dip(residual, Math.max(depth / 2, least * (1 + 1e-9)), largest)
  return low && findRoot(residual, { low, high: largest, atLow: residual(low), atHigh })
}

/** The length residual with the weld in balance; each search for the weld starts from the last one. */
function residualByRadius(membrane: Membrane): (radius: number) => number {
  let weld = WELD_START * membrane.depth
  return (radius) => {
    weld = weldHeight(membrane, radius, weld)
    return lengthResidual(membrane, radius, weld)
  }
}

/** The dip is flat: this width, in radii, leaves 1e-14 of the residual. */
const DIP_WIDTH = 1e-7

/** Golden section towards the dip of the residual; ends as soon as it is below zero. */
function dip(f: (x: number) => number, from: number, to: number): number | null {
  const ratio = (Math.sqrt(5) - 1) / 2
  let low = from
  let high = to
  if (low >= high) return null
  let left = high - ratio * (high - low)
  let right = low + ratio * (high - low)
  let atLeft = f(left)
  let atRight = f(right)
  while (high - low > DIP_WIDTH * to) {
    if (atLeft < 0) return left
    if (atRight < 0) return right
    if (atLeft < atRight) {
      high = right
      right = left
      atRight = atLeft
      left = high - ratio * (high - low)
      atLeft = f(left)
    } else {
      low = left
      left = right
      atLeft = atRight
      right = low + ratio * (high - low)
      atRight = f(right)
    }
  }
  return null
}
