import { storeToRefs } from 'pinia'
import { computed, type Ref } from 'vue'
import { guessMessage, scenePicture } from '@shared/demonstrator/picture'
import type { CourseScene } from '@shared/demonstrator/course'
import type { SceneFacts } from '@shared/demonstrator/scene-facts'
import { sectionOf, type DemoSetting } from '@shared/demonstrator/setting'
import { demoEvaluation } from '@shared/demonstrator/verdict'
import { demonstrationScene } from '@shared/drawing/demonstration'
import { pushGripScene } from '@shared/drawing/push-grip-chart'
import type { View } from '@shared/drawing/scene'
import { standingOutline } from '@shared/drawing/standing-outline'
import { measureWith } from '@shared/drawing/text-width'
import { usePreferences } from '@/stores/preferences'
import { useWords } from './useWords'

/** What a stage shows at one moment. */
export interface OnStage {
  readonly scene: CourseScene
  readonly setting: DemoSetting
  readonly facts: SceneFacts
  readonly guess: number | null
  readonly isShown: boolean
}

/** Scenes of the stage for the room there is; the type grows with it. */
export function useStagePicture(stage: () => OnStage, size: Readonly<Ref<View | null>>) {
  const { say } = useWords()
  const measure = measureWith(say)
  const section = computed(() => sectionOf(stage().setting))
  const evaluated = computed(() => demoEvaluation(stage().setting))
  const outline = computed(() => standingOutline(section.value))

  const drawing = computed(() => {
    if (!size.value) return null
    const { evaluation } = evaluated.value
    const picture = scenePicture({ ...stage(), evaluation })
    const input = {
      ...picture,
      case: section.value,
      evaluation,
      outline: outline.value,
      view: zoomed(size.value),
      measure,
    }
    return demonstrationScene(input, stage().scene.guess.place === 'bar')
  })

  return drawing
}

/** The chart of push against grip beside the drawing, in the scene that is about it. */
export function usePushGripPicture(stage: () => OnStage, size: Readonly<Ref<View | null>>) {
  const { units } = storeToRefs(usePreferences())
  const { say } = useWords()
  const measure = measureWith(say)
  return computed(() => {
    const { scene, setting, facts, guess, isShown } = stage()
    if (!size.value || facts.curve.length === 0) return null
    return pushGripScene({
      points: facts.curve,
      now: setting.values.depth,
      crossing: isShown ? facts.answer : null,
      stop: isShown && facts.holdsTo > 0 ? facts.holdsTo : null,
      guess: guess === null ? null : { value: guess, message: guessMessage(scene, guess) },
      units: units.value,
      view: zoomed(size.value),
      measure,
    })
  })
}

/** The picture is composed for this width and height, and then enlarged. */
const COMPOSED = { width: 560, height: 330 } as const
const LARGEST = 2.4

/** A smaller view of the same proportions: everything in it comes out larger. */
export function zoomed({ width, height }: View): View {
  const wanted = Math.min(width / COMPOSED.width, height / COMPOSED.height)
  const zoom = Math.min(LARGEST, Math.max(1, wanted))
  return { width: Math.round(width / zoom), height: Math.round(height / zoom) }
}
