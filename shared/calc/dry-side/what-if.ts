import { drySideThroughTime, type DrySide } from './dry-side'

/** What becomes of the pond in one variant. */
export interface PondOutcome {
  /** First moment at which the pond stands at the threshold [s]; null: it does not. */
  readonly reaches: number | null
  readonly highest: { readonly time: number; readonly level: number }
}

/** What becomes of the pond if a pump stops at a moment. */
export interface StopOutcome extends PondOutcome {
  readonly stopsAt: number
}

/**
 * What if one pump stops for good: the pond for each moment at which it might.
 *
 * @param pump Name of the pump.
 * @param threshold Level that matters, such as a sill [m].
 */
export function ifPumpStops(
  input: DrySide,
  pump: string,
  moments: readonly number[],
  threshold: number,
): readonly StopOutcome[] {
  return moments.map((stopsAt) => {
    const pumps = input.pumps.map((other) =>
      other.name === pump ? { ...other, failsAt: stopsAt } : other,
    )
    return { stopsAt, ...outcomeOf({ ...input, pumps }, threshold) }
  })
}

/** What becomes of the pond if one way is plugged. */
export interface PlugOutcome extends PondOutcome {
  readonly source: string
}

/** Ways that a plug or another line can close; rain and brooks come anyhow. */
const CLOSED_BY_PLUG = ['creases', 'joint', 'opening', 'spring', 'open-end', 'seepage']

/**
 * Which single plug helps most: the pond with each way plugged alone, the best first. Best is what
 * keeps the threshold longest, then the lowest pond.
 */
export function ifOneIsPlugged(input: DrySide, threshold: number): readonly PlugOutcome[] {
  return input.sources
    .flatMap((source, i) => {
      if (source.isPlugged || !CLOSED_BY_PLUG.includes(source.kind)) return []
      const sources = input.sources.map((other, n) =>
        n === i ? { ...other, isPlugged: true } : other,
      )
      return [{ source: source.name, ...outcomeOf({ ...input, sources }, threshold) }]
    })
    .sort((a, b) =>
      a.reaches === b.reaches
        ? a.highest.level - b.highest.level
        : (b.reaches ?? Infinity) - (a.reaches ?? Infinity),
    )
}

function outcomeOf(input: DrySide, threshold: number): PondOutcome {
  const { reaches, highest } = drySideThroughTime({ ...input, thresholds: [threshold] })
  return { reaches: reaches[0]!.time, highest }
}
