import type { CheckResult, Verdict } from '../schemas/section-result'

/** Share of the resistance up to which a check holds with room to spare. */
export const NARROW_FROM = 0.9

/** Verdict of a utilisation; null stands for a resistance that is not there. */
export function verdictOf(utilisation: number | null): Verdict {
  if (utilisation === null || utilisation > 1) return 'fails'
  return utilisation > NARROW_FROM ? 'narrow' : 'holds'
}

/** What presses and what resists, in one unit. */
export interface DemandAndResistance {
  readonly demand: number
  readonly resistance: number
}

/**
 * Compares a demand with a resistance.
 *
 *     utilisation = required × demand / resistance
 *
 * from demand and resistance, never from a negative factor. Null, and worst of all, where the
 * resistance is negative, or not there while something presses; 0 where nothing presses. The factor
 * is null where nothing acts against it.
 */
export function compare(
  { demand, resistance }: DemandAndResistance,
  required: number | null,
): CheckResult {
  const factor = demand > 0 ? finiteOrNull(resistance / demand) : null
  if (required === null) return { factor, required, utilisation: null, verdict: 'notChecked' }
  const utilisation = utilisationOf(demand, resistance, required)
  return { factor, required, utilisation, verdict: verdictOf(utilisation) }
}

function utilisationOf(demand: number, resistance: number, required: number): number | null {
  if (resistance < 0 || (resistance === 0 && demand > 0)) return null
  return demand <= 0 ? 0 : finiteOrNull((required * demand) / resistance)
}

/** A ratio too large for a number means that one side is as good as not there. */
export function finiteOrNull(ratio: number): number | null {
  return Number.isFinite(ratio) ? ratio : null
}

/** A check that the method does not cover for this case: it fails, and no figure is given. */
export function notCovered(required: number | null): CheckResult {
  if (required === null) return { factor: null, required, utilisation: null, verdict: 'notChecked' }
  return { factor: null, required, utilisation: null, verdict: 'fails' }
}

/** True if a is used up further than b: null is worst of all. */
export function isWorse(a: number | null, b: number | null): boolean {
  if (b === null) return false
  return a === null || a > b
}
