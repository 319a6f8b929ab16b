import type { LaidJob } from './laying-run'

/** The section that has least time left when it is finished. */
export interface LeastMargin {
  /** Place in the list of jobs. */
  readonly job: number
  /** Deadline less finish [s]; negative: late. */
  readonly margin: number
}

/**
 * The least margin of what is laid; the first in the order among equals.
 *
 * @param deadlines By job [s]; infinite where the water does not come.
 * @returns null where it comes to no section.
 */
export function leastMargin(
  laid: readonly LaidJob[],
  deadlines: readonly number[],
): LeastMargin | null {
  let least: LeastMargin | null = null
  for (const { job, finish } of laid) {
    const margin = deadlines[job]! - finish
    if (margin < Infinity && (least === null || margin < least.margin)) least = { job, margin }
  }
  return least
}
