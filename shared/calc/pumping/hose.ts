import { frictionFactor } from './friction-factor'

/** A hose or main from pump to outlet. */
export interface Hose {
  /** Inner diameter [m]. */
  readonly diameter: number
  readonly length: number
  /** Roughness height, ε [m]. */
  readonly roughness: number
  /** Sum of the loss coefficients of all fittings, K [–]; includes the exit loss. */
  readonly minorLoss: number
}

/** What the hose leads, and where. */
export interface HoseFlow {
  readonly hose: Hose
  /** Kinematic viscosity, ν [m²/s]. */
  readonly viscosity: number
  readonly gravity: number
}

/** Mean speed in the hose [m/s]. */
export function hoseSpeed(hose: Hose, flow: number): number {
  return flow / ((Math.PI * hose.diameter ** 2) / 4)
}

/**
 * Head lost in a hose by Darcy–Weisbach: (f L/D + K) V²/2g   [m].
 *
 * @param flow Discharge [m³/s], 0 or more.
 */
export function hoseLoss({ hose, viscosity, gravity }: HoseFlow, flow: number): number {
  if (flow <= 0) return 0
  const speed = hoseSpeed(hose, flow)
  const factor = frictionFactor((speed * hose.diameter) / viscosity, hose.roughness / hose.diameter)
  return ((factor * hose.length) / hose.diameter + hose.minorLoss) * (speed ** 2 / (2 * gravity))
}
