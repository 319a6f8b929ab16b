import { computed, type Ref } from 'vue'
import { checkLine, type HoldingProfiles, type LineAnswer } from '@shared/checks/line-check'
import type { ScenarioContent } from '@shared/schemas/scenario'
import { isSameValue } from '@/scenario/same-value'
import type { SurveyedLine } from '@/scenario/place-on-line'
import { useDeferred } from './useDeferred'

interface Kept {
  readonly line: SurveyedLine
  readonly content: ScenarioContent
  readonly profiles: HoldingProfiles
}

/**
 * The answer of a whole line. What does not depend on the level is computed once things have settled
 * and then kept, so that every section follows the water while it moves.
 */
export function useLineCheck(
  line: Readonly<Ref<SurveyedLine>>,
  content: Readonly<Ref<ScenarioContent>>,
) {
  const still = computed<ScenarioContent>((last) => {
    const next = withoutWater(content.value)
    return last && isSameValue(last, next) ? last : next
  })
  const settled = useDeferred(
    () => ({ line: line.value, content: still.value }),
    prepare,
    prepare({ line: line.value, content: content.value }),
  )
  const answer = computed<LineAnswer>(() => {
    const { line: surveyed, content: kept, profiles } = settled.result.value
    const { waterLevel } = content.value
    return checkLine(surveyed, { ...kept, waterLevel }, profiles)
  })
  return { answer, isUpdating: settled.isPending }
}

/** Level, place and what is read beside them change nothing in what a section can hold. */
function withoutWater(content: ScenarioContent): ScenarioContent {
  return { ...content, waterLevel: 0, place: 0, levelNow: null, rateOfRise: null, timeToClear: 0 }
}

function prepare({ line, content }: { line: SurveyedLine; content: ScenarioContent }): Kept {
  const profiles: HoldingProfiles = new Map()
  checkLine(line, content, profiles)
  return { line, content, profiles }
}
