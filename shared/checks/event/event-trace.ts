import { CHECK_IDS, VERDICTS, type CheckId, type Verdict } from '../../schemas/check-ids'

/** The section at one moment. */
export interface EventMoment {
  readonly time: number
  /** Depths of water on the wet and the dry side [m]. */
  readonly depth: number
  readonly dryDepth: number
  /** Gauge pressure of the air [Pa]. */
  readonly airPressure: number
  /** Water under the skirt, U [N/m]. */
  readonly uplift: number
  readonly verdict: Verdict
  /** What is used furthest. */
  readonly governs: CheckId
  /** Utilisation of what governs; null: nothing resists. */
  readonly utilisation: number | null
  /** Factors of sliding and of the skirt; null: nothing acts against it, or not covered. */
  readonly sliding: number | null
  readonly skirt: number | null
  /** Freeboard that is there [m]; null where the tube does not stand. */
  readonly freeboard: number | null
}

/** Figures of a moment in the order of their columns. */
const COLUMNS = [
  'time',
  'depth',
  'dryDepth',
  'airPressure',
  'uplift',
  'utilisation',
  'sliding',
  'skirt',
  'freeboard',
] as const

/** What null looks like in a column; no figure can be that large. */
const NOTHING = Number.MAX_VALUE

/**
 * Every moment of an event in a few flat arrays, so that a worker can hand a thousand moments of
 * five hundred sections over without copying. Read it with `momentAt`.
 */
export interface EventTrace {
  readonly length: number
  /** Row by row: the columns of one moment after the other. */
  readonly figures: Float64Array
  /** Verdict and governing check of a moment, as places in `VERDICTS` and `CHECK_IDS`. */
  readonly verdicts: Uint8Array
  readonly governs: Uint8Array
}

/** Room for so many moments. */
export function emptyTrace(length: number): EventTrace {
  return {
    length,
    figures: new Float64Array(length * COLUMNS.length),
    verdicts: new Uint8Array(length),
    governs: new Uint8Array(length),
  }
}

/** Writes a moment into a trace. */
export function writeMoment(trace: EventTrace, index: number, moment: EventMoment): void {
  const { figures } = trace
  const row = index * COLUMNS.length
  figures[row] = moment.time
  figures[row + 1] = moment.depth
  figures[row + 2] = moment.dryDepth
  figures[row + 3] = moment.airPressure
  figures[row + 4] = moment.uplift
  figures[row + 5] = moment.utilisation ?? NOTHING
  figures[row + 6] = moment.sliding ?? NOTHING
  figures[row + 7] = moment.skirt ?? NOTHING
  figures[row + 8] = moment.freeboard ?? NOTHING
  trace.verdicts[index] = VERDICTS.indexOf(moment.verdict)
  trace.governs[index] = CHECK_IDS.indexOf(moment.governs)
}

/** The moment at a place of a trace, 0 to length − 1. */
export function momentAt(trace: EventTrace, index: number): EventMoment {
  const { figures } = trace
  const row = index * COLUMNS.length
  return {
    time: figures[row]!,
    depth: figures[row + 1]!,
    dryDepth: figures[row + 2]!,
    airPressure: figures[row + 3]!,
    uplift: figures[row + 4]!,
    verdict: VERDICTS[trace.verdicts[index]!]!,
    governs: CHECK_IDS[trace.governs[index]!]!,
    utilisation: orNull(figures[row + 5]!),
    sliding: orNull(figures[row + 6]!),
    skirt: orNull(figures[row + 7]!),
    freeboard: orNull(figures[row + 8]!),
  }
}

function orNull(figure: number): number | null {
  return figure === NOTHING ? null : figure
}

/** All moments of a trace. */
export function momentsOf(trace: EventTrace): readonly EventMoment[] {
  return Array.from({ length: trace.length }, (_, i) => momentAt(trace, i))
}
