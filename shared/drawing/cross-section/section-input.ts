import type { LoadedOutline } from '../../calc/loaded-shape/loaded-outline'
import type { SectionCase } from '../../schemas/section-case'
import type { SectionResult } from '../../schemas/section-result'
import type { View } from '../scene'
import type { MeasureText } from '../text-width'
import type { UnitSystem } from '../../units'

/** Answers of the engine that the drawing shows. */
export type DrawnEvaluation = Pick<
  SectionResult,
  'thrust' | 'vertical' | 'sliding' | 'freeboard' | 'loadedShape' | 'verdict' | 'governs'
>

/** The last shape that stood as the water rose. */
export interface LastStanding {
  readonly outline: LoadedOutline
  /** Depth of water at which it stood [m]. */
  readonly depth: number
  /** Its crest above the ground [m]. */
  readonly crest: number
}

/** Where the ground lies, so that heights can be given as levels. */
export interface GroundLevel {
  /** Level of the ground at the weld line [m]. */
  readonly ground: number
  /** Name of the datum, as printed behind a level. */
  readonly datum: string
}

/** Depths worth a mark at the edge of the drawing [m]; what is left out is not drawn. */
export interface SectionMarks {
  readonly low?: number | null | undefined
  readonly expected?: number | null | undefined
  readonly high?: number | null | undefined
  readonly holdsTo?: number | null | undefined
  readonly leave?: number | null | undefined
}

/** Everything that one drawing of a section needs. */
export interface CrossSectionInput {
  readonly case: SectionCase
  readonly evaluation: DrawnEvaluation
  /** Null where the tube does not stand. */
  readonly outline: LoadedOutline | null
  readonly lastStanding?: LastStanding | null | undefined
  readonly level?: GroundLevel | null | undefined
  readonly marks?: SectionMarks | undefined
  readonly view: View
  /** Units in which the scales are round figures; metric if left out. */
  readonly units?: UnitSystem | undefined
  /** Width of the texts as they will be printed; metric English if left out. */
  readonly measure?: MeasureText | undefined
}
