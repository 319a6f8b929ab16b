import { computed, type Ref } from 'vue'
import {
  holdsToWords,
  leaveWords,
  shapeWords,
  waterWords,
  type WaterPlace,
} from '@/quick-check/verdict-words'
import type { SectionCheck } from './useSectionCheck'
import { useWords } from './useWords'

/** The verdict in words: water, what it holds to, when to leave, and the same in one sentence. */
export function useVerdictWords(check: SectionCheck) {
  const { t, say } = useWords()
  const place: Ref<WaterPlace> = check.water
  const water = computed(() => waterWords(say, place.value))
  const holdsTo = computed(() =>
    holdsToWords(say, check.holdsTo.value, place.value, check.isSkirtless.value),
  )
  const leave = computed(() => leaveWords(say, check.leave.value, place.value))
  const shape = computed(() => {
    const { barrier, water: wet } = check.section.value
    return shapeWords(say, check.evaluation.value.loadedShape, wet.depth, barrier.diameter)
  })
  const sentence = computed(() => {
    const { verdict, governs } = check.evaluation.value
    return t('quickCheck.announce', {
      verdict: t(`checks.verdict.${verdict}`),
      water: water.value,
      holdsTo: holdsTo.value,
      leave: leave.value,
      governs: t(`checks.name.${governs}`),
    })
  })
  return { water, holdsTo, leave, shape, sentence }
}
