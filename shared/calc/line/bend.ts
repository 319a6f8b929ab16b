/** A joint at which the line turns. */
export interface Bend {
  /** Turn, positive to the left, away from the water on the right [rad]. */
  readonly angle: number
  readonly diameter: number
  readonly skirtLength: number
  readonly sectionLength: number
  /** Largest turn that one joint closure takes [rad]. */
  readonly largestTurn: number
}

export interface BendAnswer {
  /** Closures that share the turn equally. */
  readonly closures: number
  /** Outer gap at one closure, 2 D sin(θ/2) [m]. */
  readonly outerGap: number
  /** Skirt that is missing in the opened sector, ½ L² θ [m²]; none where the turn folds it. */
  readonly missingSkirt: number
  /** Share of its friction resistance and skirt grip that each of both sections loses [–]. */
  readonly lostShare: number
}

/** Turns may exceed the limit by so much: 0.5° [rad]. */
const TOLERANCE = (0.5 * Math.PI) / 180

/**
 * What a bend costs. Only a turn away from the water opens the skirt; a turn towards it folds it. The
 * missing sector ½ L² θ is shared: each of the two sections loses ½ L² θ/(2 L × section length) of its
 * grip. A turn that needs more than one closure is divided equally.
 */
export function bend(input: Bend): BendAnswer {
  const { angle, diameter, skirtLength, sectionLength, largestTurn } = input
  const turn = Math.abs(angle)
  const closures = Math.max(1, Math.ceil((turn - TOLERANCE) / largestTurn))
  const missingSkirt = angle > 0 ? 0.5 * skirtLength ** 2 * angle : 0
  return {
    closures,
    outerGap: 2 * diameter * Math.sin(turn / closures / 2),
    missingSkirt,
    lostShare: skirtLength === 0 ? 0 : missingSkirt / (2 * skirtLength * sectionLength),
  }
}

/** Area that is left to close at a step between two sizes, π (D₁² − D₂²)/4 [m²]. */
export function stepArea(larger: number, smaller: number): number {
  return (Math.PI * (larger ** 2 - smaller ** 2)) / 4
}
