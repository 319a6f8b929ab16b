import { computed } from 'vue'
import { holdsToWords, leaveWords, shapeWords, waterWords } from '@/quick-check/verdict-words'
import type { SectionCheck } from './useSectionCheck'
import { useWords } from './useWords'

/** What the words need to know of a check. */
export type Worded = Pick<
  SectionCheck,
  'section' | 'evaluation' | 'water' | 'holdsTo' | 'leave' | 'isSkirtless'
>

/** The verdict in words: water, what it holds to, when to leave, and the same in one sentence. */
export function useVerdictWords(check: Worded) {
  const { t, say } = useWords()
  const place = check.water
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
