import { computed } from 'vue'
import { useCalm } from './useCalm'
import type { SectionCheck } from './useSectionCheck'

/**
 * The figures of a check for what is read beside the drawing: they follow a drag at their own pace,
 * but another verdict, or another check that governs, at once.
 */
export function useCalmCheck(check: SectionCheck) {
  const calm = useCalm(
    () => ({
      section: check.section.value,
      still: check.still.value,
      evaluation: check.evaluation.value,
      water: check.water.value,
      marks: check.marks.value,
      holdsTo: check.holdsTo.value,
      leave: check.leave.value,
      stated: check.stated.value,
    }),
    { urgent: () => `${check.evaluation.value.verdict} ${check.evaluation.value.governs}` },
  )
  return {
    section: computed(() => calm.value.section),
    still: computed(() => calm.value.still),
    evaluation: computed(() => calm.value.evaluation),
    water: computed(() => calm.value.water),
    marks: computed(() => calm.value.marks),
    holdsTo: computed(() => calm.value.holdsTo),
    leave: computed(() => calm.value.leave),
    stated: computed(() => calm.value.stated),
  }
}
