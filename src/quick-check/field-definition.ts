import type { AllowedRange } from '@shared/errors'
import type { NumericPath } from '@shared/schemas/section-ranges'
import type { QuantityKind } from '@shared/units'

/** One number that a person enters in the Quick check. */
export interface FieldDefinition {
  /** What it measures, and so in which unit it is shown. */
  readonly kind: QuantityKind
  /** Its key in the address. */
  readonly key: string
  /** Default case, in SI; null: left empty. */
  readonly initial: number | null
  /** Where it goes in the case; its range is then the one of `SECTION_RANGES`. */
  readonly path?: NumericPath
  /** Range of a field that the case does not know. */
  readonly range?: AllowedRange
  /** May be left empty. */
  readonly isOptional?: true
  /** In every address, also when it is the default: what the answer rests on most. */
  readonly isAlwaysSent?: true
  /** `before`: belongs to "before the water comes" and leaves the verdict alone. */
  readonly group?: 'before'
}
