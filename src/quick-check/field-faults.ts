import { isInRange, type AllowedRange } from '@shared/errors'
import { resolveRange, type NumericPath } from '@shared/schemas/section-ranges'
import { gaugeOffset, tidy, type CaseInput, type FieldValues } from './case-input'
import { FIELD_IDS, fieldOf, type FieldId } from './fields'

/** Why a field is refused. */
export type FaultReason =
  | 'empty'
  | 'text'
  | 'range'
  | 'neededWithWaves'
  | 'neededWhileDeveloping'
  | 'neededWithPermeability'

/** A refused field with what it may hold, in SI. */
export interface FieldFault {
  readonly field: FieldId
  readonly reason: FaultReason
  readonly range: AllowedRange
  /** The number that was typed, in SI; null where it is not a number. */
  readonly value: number | null
}

/** What was read from each field: a number in SI, null where empty, undefined where it is no number. */
export type ReadValues = Readonly<Record<FieldId, number | null | undefined>>

/** Input as it stands in the form, right or wrong. */
export interface FormInput {
  readonly values: ReadValues
  readonly choices: CaseInput['choices']
}

const BY_PATH = new Map<NumericPath, FieldId>(
  FIELD_IDS.flatMap((id) => {
    const { path } = fieldOf(id)
    return path ? [[path, id] as const] : []
  }),
)

/** False for a field that the chosen way of entering leaves out. */
export function isInUse(id: FieldId, { waterMode, upliftModel }: CaseInput['choices']): boolean {
  if (id === 'depth') return waterMode === 'depth'
  if (id === 'level') return waterMode === 'level'
  if (id === 'groundLevel') return waterMode !== 'depth'
  if (id === 'stage' || id === 'gaugeZero' || id === 'gaugeCorrection') return waterMode === 'gauge'
  if (id === 'diffusivity' || id === 'upliftTime') return upliftModel === 'developing'
  return true
}

/** The range of a field in SI; a level or a gauge reading follows the ground and the diameter. */
export function rangeOfField(id: FieldId, input: FormInput): AllowedRange {
  const { path, range } = fieldOf(id)
  if (path) return resolveRange(path, (other) => input.values[BY_PATH.get(other)!])
  if (id === 'level') return depthRangeFrom(input, 0) ?? range!
  if (id === 'stage') return stageRange(input) ?? range!
  if (id === 'waterNow') {
    const top = topRange(input)
    return top ? { ...top, min: tidy(top.min - LOW_WATER) } : range!
  }
  return range!
}

/** A river may stand so far below the ground at the barrier [m]. */
const LOW_WATER = 50

/** Range of the water in the way in which it is entered. */
function topRange(input: FormInput): AllowedRange | null {
  if (input.choices.waterMode === 'depth') return rangeOfField('depth', input)
  return input.choices.waterMode === 'level' ? depthRangeFrom(input, 0) : stageRange(input)
}

function stageRange(input: FormInput): AllowedRange | null {
  const offset = gaugeOffset(input.values as FieldValues)
  return Number.isFinite(offset) ? depthRangeFrom(input, offset) : null
}

/** Range of the depth, seen from a zero that lies `offset` above the datum. */
function depthRangeFrom(input: FormInput, offset: number): AllowedRange | null {
  const ground = input.values.groundLevel
  if (typeof ground !== 'number') return null
  const { min, max, unit } = rangeOfField('depth', input)
  return { min: tidy(ground - offset + min), max: tidy(ground - offset + max), unit }
}

function neededReason(id: FieldId, { values, choices }: FormInput): FaultReason | null {
  if (id === 'layerThickness' && typeof values.permeability === 'number')
    return 'neededWithPermeability'
  if (id === 'wavePeriod' && (values.waveHeight ?? 0) > 0) return 'neededWithWaves'
  if ((id === 'diffusivity' || id === 'upliftTime') && choices.upliftModel === 'developing')
    return 'neededWhileDeveloping'
  return fieldOf(id).isOptional ? null : 'empty'
}

/** The fault of one field, or null. */
export function fieldFault(field: FieldId, input: FormInput): FieldFault | null {
  if (!isInUse(field, input.choices)) return null
  const value = input.values[field]
  const range = rangeOfField(field, input)
  if (value === undefined) return { field, reason: 'text', range, value: null }
  if (value === null) {
    const reason = neededReason(field, input)
    return reason && { field, reason, range, value }
  }
  return isInRange(value, range) ? null : { field, reason: 'range', range, value }
}

/** Every refused field of the group: the section itself, or what comes before the water. */
export function fieldFaults(input: FormInput, group: 'section' | 'before'): FieldFault[] {
  return FIELD_IDS.filter((id) => (fieldOf(id).group ?? 'section') === group).flatMap(
    (id) => fieldFault(id, input) ?? [],
  )
}
