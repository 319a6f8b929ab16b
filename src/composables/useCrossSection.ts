import { storeToRefs } from 'pinia'
import { computed, type Ref } from 'vue'
import {
  crossSectionScene,
  type DrawnEvaluation,
  type GroundLevel,
  type SectionMarks,
} from '@shared/drawing/cross-section'
import type { View } from '@shared/drawing/scene'
import { lastStanding, standingOutline } from '@shared/drawing/standing-outline'
import { measureWith } from '@shared/drawing/text-width'
import type { SectionCase } from '@shared/schemas/section-case'
import { isSameButDepth } from '@/quick-check/same-section'
import { usePreferences } from '@/stores/preferences'
import { useSceneText } from './useSceneText'

/** What the drawing of a section shows. */
export interface DrawnSection {
  readonly section: SectionCase
  readonly evaluation: DrawnEvaluation
  readonly marks?: SectionMarks | undefined
  readonly level?: GroundLevel | null | undefined
}

/**
 * The scene of a section, composed for a size. The last standing shape does not depend on the depth,
 * so it is searched once and kept while only the water moves.
 */
export function useCrossSection(drawn: () => DrawnSection) {
  const say = useSceneText()
  const { units } = storeToRefs(usePreferences())
  const still = computed<SectionCase>((kept) => {
    const { section } = drawn()
    return kept && isSameButDepth(kept, section) ? kept : section
  })
  const last = computed(() => lastStanding(still.value))
  const outline = computed(() => standingOutline(drawn().section))
  const measure = computed(() => measureWith(say.value))

  function compose(view: View) {
    const { section, evaluation, marks, level } = drawn()
    return crossSectionScene({
      case: section,
      evaluation,
      outline: outline.value,
      lastStanding: outline.value ? null : last.value,
      marks,
      level,
      view,
      units: units.value,
      measure: measure.value,
    })
  }

  /** The scene for a size that may not be known yet. */
  function sceneFor(view: Readonly<Ref<View | null>>) {
    return computed(() => view.value && compose(view.value))
  }

  return { compose, sceneFor }
}
