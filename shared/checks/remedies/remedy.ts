import type { SizeRun } from '../../schemas/scenario'
import type { CheckId } from '../../schemas/section-result'

/** What can be done about a section. The last three need another tube, or another line. */
export const REMEDY_KINDS = [
  'lay',
  'size',
  'air',
  'weigh',
  'seal',
  'skirt',
  'room',
  'move',
] as const
export type RemedyKind = (typeof REMEDY_KINDS)[number]

/** One thing that would help a section, all else as it is, and what it costs. */
export interface Remedy {
  readonly kind: RemedyKind
  /** What would be laid over the section; null where the scenario cannot say it. */
  readonly run: SizeRun | null
  /** Level to which the section would hold [m]; null where nothing would. */
  readonly holdsToLevel: number | null
  /** How much higher than now [m]; null where nothing held before. */
  readonly gain: number | null
  /** What fails in the section beyond that level. */
  readonly limitedBy: CheckId | null
  /** The section would hold at the level that is checked. */
  readonly isEnough: boolean
  /** Extra time of a crew [s]. */
  readonly crewTime: number
  /** Extra mass to carry [kg]. */
  readonly mass: number
  /** Pieces that the store lacks for it; null where no store is known. */
  readonly short: number | null
  /** New air pressure [Pa], longer skirt [m], missing room [m], or ground that is needed [m]. */
  readonly value: number | null
}

/** A remedy that gains less is not offered [m]. */
export const LEAST_GAIN = 0.005

/** True for what can be done tonight with what is in the store. */
export function isAtHand({ kind, run, short }: Remedy): boolean {
  return run !== null && kind !== 'skirt' && (short ?? 0) === 0
}

/**
 * Orders remedies: what is at hand first, then what is enough, then least extra time of a crew, then
 * least mass to carry. Of those that are not enough, what gains most comes first.
 */
export function compareRemedies(a: Remedy, b: Remedy): number {
  if (isAtHand(a) !== isAtHand(b)) return isAtHand(a) ? -1 : 1
  if (a.isEnough !== b.isEnough) return a.isEnough ? -1 : 1
  if (!a.isEnough) {
    const gained = (b.holdsToLevel ?? -Infinity) - (a.holdsToLevel ?? -Infinity)
    if (Math.abs(gained) > LEAST_GAIN) return gained
  }
  return a.crewTime - b.crewTime || a.mass - b.mass
}
