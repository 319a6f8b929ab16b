import type { Bends } from '@shared/checks/bend-loss'
import type { SectionCase } from '@shared/schemas/section-case'
import { depthNow, groundLevel, sectionCase, waterLevel, type CaseInput } from './case-input'
import type { WaterPlace } from './verdict-words'

/** One cross-section with what its answer in words needs besides: Quick check and scenario give it. */
export interface CheckedCase {
  readonly section: SectionCase
  readonly water: WaterPlace
  /** Depth of the water at this moment [m]; null where it is not known. */
  readonly depthNow: number | null
  /** Rate of rise [m/s]; null where it is not known. */
  readonly rateOfRise: number | null
  /** Time needed to clear the area [s]. */
  readonly timeToClear: number
  /** Height on the maker's label [m]; null where none is known. */
  readonly statedHeight: number | null
  /** How far the water may be off, either way [m]. */
  readonly uncertainty: number
  /** Bends of the line beside the section, which take their share of its resistance. */
  readonly bends?: Bends | null
}

/** What the Quick check asks. */
export function checkedCase(input: CaseInput): CheckedCase {
  const { rateOfRise, clearTime, statedHeight, uncertainty } = input.values
  const section = sectionCase(input)
  return {
    section,
    water: {
      depth: section.water.depth,
      level: waterLevel(input),
      ground: groundLevel(input),
    },
    depthNow: depthNow(input),
    rateOfRise,
    timeToClear: clearTime ?? 0,
    statedHeight,
    uncertainty: uncertainty ?? 0,
  }
}
