const DEGREE = Math.PI / 180

/** Largest turn that a joint of the example tubes takes: 90° [rad]. Common practice, no source. */
export const LARGEST_TURN = 90 * DEGREE

/** Largest turn that one closure takes; a sharper one needs two: 45° [rad]. Common practice, no source. */
export const LARGEST_CLOSURE_TURN = 45 * DEGREE

/** Turns may exceed a limit by so much, which no survey tells apart: 0.5° [rad]. */
export const TURN_TOLERANCE = 0.5 * DEGREE

/** Room that a skirt needs beside it on the wet side [m]. Judgement. */
export const SKIRT_ROOM = 0.3

/** True for a turn that no joint takes. */
export function isTurnTooSharp(angle: number): boolean {
  return Math.abs(angle) > LARGEST_TURN + TURN_TOLERANCE
}
