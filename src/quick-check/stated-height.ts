import { evaluateSection } from '@shared/checks/evaluate-section'
import type { SectionCase } from '@shared/schemas/section-case'
import type { CheckId } from '@shared/schemas/section-result'

/** Where the height of the tube goes: diameter = depth + sag + freeboard + moving + spare. */
export interface StatedHeight {
  /** Height on the label [m]. */
  readonly stated: number
  /** Depth to which every check is met [m]; 0 where none is. */
  readonly depth: number
  /** Unloaded diameter less the loaded crest at that depth [m]. */
  readonly sag: number
  /** Freeboard that is required [m]. */
  readonly freeboard: number
  /** For waves and the velocity head of the current [m]. */
  readonly allowance: number
  /** Height that stays dry because another check gives way first [m]. */
  readonly spare: number
  /** The check that gives way first. */
  readonly check: CheckId
}

/** Answers "but it says 0.70 m on the bag"; null where no height is stated. */
export function statedHeight(
  stated: number | null,
  section: SectionCase,
  holdsTo: { readonly depth: number; readonly check: CheckId },
): StatedHeight | null {
  if (stated === null) return null
  const { depth, check } = holdsTo
  const none = { stated, depth: 0, sag: 0, freeboard: 0, allowance: 0, spare: 0, check }
  if (depth <= 0) return none
  const at = evaluateSection({ ...section, water: { ...section.water, depth } })
  if (!at.loadedShape.solved || at.freeboard.available === null) return none
  const { crest } = at.loadedShape
  const freeboard = section.requiredFreeboard
  return {
    stated,
    depth,
    sag: section.barrier.diameter - crest,
    freeboard,
    allowance: crest - depth - at.freeboard.available,
    spare: Math.max(0, at.freeboard.available - freeboard),
    check,
  }
}
