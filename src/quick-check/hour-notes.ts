import type { SectionEvaluation } from '@shared/checks/evaluate-section'
import type { SectionCase } from '@shared/schemas/section-case'
import type { Message } from '@shared/texts/format-text'
import type { Quantity } from '@shared/units'
import { atTemperature, type AtTemperature } from './before-water'
import type { FieldValues } from './case-input'

/** Air temperatures of the night and of the day, as they were entered. */
export type Hours = Pick<FieldValues, 'filledAt' | 'coldest' | 'hottest'>

/**
 * What the coldest and the hottest hour make of an answer, where they make it worse: a tube that goes
 * limp or gives way, freeboard that is used up, a seat that may open, fabric that is strained. Empty where the answer stands
 * in both, or where it does not hold as it is.
 */
export function hourNotes(
  section: SectionCase,
  { verdict }: Pick<SectionEvaluation, 'verdict'>,
  { filledAt, coldest, hottest }: Hours,
): readonly Message[] {
  if (verdict === 'fails' || filledAt === null) return []
  return [
    noteAt('cold', section, filledAt, coldest),
    noteAt('hot', section, filledAt, hottest),
  ].filter((note) => note !== null)
}

function noteAt(
  hour: 'cold' | 'hot',
  section: SectionCase,
  filledAt: number,
  now: number | null,
): Message | null {
  if (now === null) return null
  const at = atTemperature(section, filledAt, now)
  const unitWeight = section.water.density * section.gravity
  const outcome = outcomeOf(at, unitWeight * section.water.depth)
  if (outcome === null) return null
  const key = `quickCheck.hours.${hour}.${outcome}`
  const temperature: Quantity = { value: now, kind: 'temperature' }
  const air: Quantity = { value: at.airPressure, kind: 'pressure', rounding: 'down' }
  return { key, values: { temperature, air } }
}

/**
 * What fails first in that hour; null where everything holds.
 *
 * @param seal Pressure that keeps the seat closed, ρ g h [Pa].
 */
export function outcomeOf(
  { evaluation, airPressure }: AtTemperature,
  seal: number,
): 'limp' | 'down' | 'soft' | 'fails' | 'fabric' | null {
  if (!evaluation) return 'limp'
  if (evaluation.verdict !== 'fails') return airPressure < seal ? 'soft' : null
  if (!evaluation.loadedShape.solved) return 'down'
  return evaluation.governs === 'fabric' ? 'fabric' : 'fails'
}
