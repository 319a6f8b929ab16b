import type { EventMoment } from './event-trace'

/** What the levels make of a section at a moment. */
export interface Conditions {
  /** Depths of water on the wet and the dry side [m]. */
  readonly depth: number
  readonly dryDepth: number
  /** Gauge pressure of the air [Pa]. */
  readonly airPressure: number
}

/** Depths are told apart to this much [m]; in between the deeper one counts. */
export const DEPTH_TICK = 1e-4

/** Answers that are kept at most: beyond, what is kept is let go. */
const MOST_KEPT = 200_000

/** Ticks in which a depth on the dry side is told apart at most: 10 m. */
const DRY_TICKS = 100_000

/**
 * Answers for one case and one share of grip, by depth to 0.1 mm and by air pressure: sections of one
 * size on one ground meet the same depths at other hours, and each is computed once. Depths are rounded
 * up, which is the safe side on the wet side and beside a pond alike.
 */
export class KeptChecks {
  private readonly byPressure = new Map<number, Map<number, EventMoment>>()
  private count = 0

  /** The answer at these conditions; computed where it is not kept. */
  at(conditions: Conditions, compute: (at: Conditions) => EventMoment): EventMoment {
    const { airPressure } = conditions
    const ticks = ticksOf(conditions.depth)
    const dryTicks = ticksOf(conditions.dryDepth)
    const answers = this.answersAt(airPressure)
    const key = ticks * DRY_TICKS + dryTicks
    const kept = answers.get(key)
    if (kept) return kept
    const depth = ticks * DEPTH_TICK
    const answer = compute({ depth, dryDepth: dryTicks * DEPTH_TICK, airPressure })
    answers.set(key, answer)
    this.count += 1
    return answer
  }

  private answersAt(airPressure: number): Map<number, EventMoment> {
    if (this.count >= MOST_KEPT) {
      this.byPressure.clear()
      this.count = 0
    }
    const kept = this.byPressure.get(airPressure)
    if (kept) return kept
    const answers = new Map<number, EventMoment>()
    this.byPressure.set(airPressure, answers)
    return answers
  }
}

/** 1e-6 ticks: what binary arithmetic adds to a depth that is a whole number of ticks. */
function ticksOf(depth: number): number {
  return Math.ceil(depth / DEPTH_TICK - 1e-6)
}
