import { computed, type Ref } from 'vue'
import { gripShareBeside, type Bends, type GripShareFor } from '@shared/checks/bend-loss'
import type { SectionEvaluation } from '@shared/checks/evaluate-section'
import { holdingProfile, holdsToAt, type HoldingProfile } from '@shared/checks/holds-to'
import { justEnough } from '@shared/checks/just-enough'
import { leaveLevel, type LeaveLevel } from '@shared/checks/leave-level'
import { whatDecides } from '@shared/checks/what-decides'
import type { SectionCase } from '@shared/schemas/section-case'
import type { HoldsTo } from '@shared/schemas/section-result'
import type { CheckedCase } from '@/quick-check/checked-case'
import { pageEvaluation } from '@/quick-check/page-evaluation'
import { isSameButDepth } from '@/quick-check/same-section'
import { statedHeight } from '@/quick-check/stated-height'
import { nextTube } from '@/quick-check/tube'
import { waterMarks } from '@/quick-check/water-marks'
import { isSameValue } from '@/scenario/same-value'
import { useDeferred } from './useDeferred'

/**
 * The answers for one valid case. What follows the water is computed for every change; what does
 * not depend on it is kept while only the water moves, and deferred when anything else changes.
 */
export function useSectionCheck(input: Readonly<Ref<CheckedCase>>) {
  const section = computed(() => input.value.section)
  const shareFor = useGripShare(input)
  const gripShare = computed(() => shareFor.value(section.value.barrier.skirtLength))
  const evaluation = computed<SectionEvaluation>(() =>
    pageEvaluation(section.value, gripShare.value),
  )
  const still = computed<SectionCase>((last) =>
    last && isSameButDepth(last, section.value) ? last : section.value,
  )

  const asked = computed<Asked>((last) => {
    const isSame = last?.of === still.value && last.shareFor === shareFor.value
    return isSame ? last : { of: still.value, shareFor: shareFor.value }
  })
  const profile = useDeferred(() => asked.value, profileOf, profileOf(asked.value))
  const decides = useDeferred(
    () => asked.value,
    ({ of, shareFor: share }) => whatDecides(of, nextTube(of.barrier.diameter), share),
    null,
  )
  const enough = useDeferred(
    () => ({ of: section.value, shareFor: shareFor.value }),
    ({ of, shareFor: share }) => justEnough(of, share),
    null,
  )

  const holdsTo = computed<HoldsTo>((last) => {
    const next = holdsToAt(profile.result.value, section.value.water.depth)
    const isSame = last?.depth === next.depth && last.from === next.from
    return isSame && last.check === next.check ? last : next
  })
  const leave = computed(() => leaveOf(input.value, holdsTo.value))
  const stated = computed(() => statedHeight(input.value.statedHeight, still.value, holdsTo.value))
  const water = computed(() => input.value.water)
  const marks = computed(() => waterMarks(section.value, input.value.uncertainty))

  return {
    section,
    still,
    evaluation,
    water,
    marks,
    holdsTo,
    leave,
    stated,
    isUpdating: profile.isPending,
    decides: decides.result,
    isDeciding: decides.isPending,
    enough: enough.result,
    isSkirtless: computed(() => section.value.barrier.skirtLength === 0),
  }
}

/** What bends leave of the grip; the same function as long as the bends stay. */
function useGripShare(input: Readonly<Ref<CheckedCase>>): Readonly<Ref<GripShareFor>> {
  const bends = computed<Bends | null>((last) => {
    const next = input.value.bends ?? null
    return last && next && isSameValue(last, next) ? last : next
  })
  return computed(() => gripShareBeside(bends.value))
}

interface Asked {
  readonly of: SectionCase
  readonly shareFor: GripShareFor
}

function profileOf({ of, shareFor }: Asked): HoldingProfile {
  return holdingProfile(of, shareFor(of.barrier.skirtLength))
}

function leaveOf(checked: CheckedCase, holdsTo: HoldsTo): LeaveLevel {
  const { section, depthNow, rateOfRise, timeToClear } = checked
  return leaveLevel({
    holdsToDepth: holdsTo.depth,
    holdsFrom: holdsTo.from,
    depth: section.water.depth,
    depthNow,
    rateOfRise,
    timeToClear,
  })
}

export type SectionCheck = ReturnType<typeof useSectionCheck>
