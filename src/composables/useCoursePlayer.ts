import { computed, ref, shallowReactive, shallowRef, watch, type Ref } from 'vue'
import type { Course, CourseScene } from '@shared/demonstrator/course'
import { nudged } from '@/demonstrator/nudged'
import { scriptDuration, valuesAt } from '@shared/demonstrator/motion'
import { factsKey, sceneFacts, type SceneFacts } from '@shared/demonstrator/scene-facts'
import { withValues, type DemoSetting, type DemoValues } from '@shared/demonstrator/setting'
import type { Phase } from '@/demonstrator/stage-channel'
import { useSceneMotion } from './useSceneMotion'

/**
 * Plays a course: each scene asks, shows, and lets go on. What is changed by hand stays until the
 * script is called back.
 *
 * @param number Number of the scene from 1, kept by whoever calls (in the address).
 */
export function useCoursePlayer(course: Readonly<Ref<Course>>, number: Ref<number>) {
  const scene = computed(() => course.value.scenes[number.value - 1] ?? course.value.scenes[0]!)
  const { guess, guesses, nudge } = useGuesses(scene)
  const script = useSceneScript(scene)
  const { phase } = script

  function goTo(next: number): void {
    number.value = Math.min(course.value.scenes.length, Math.max(1, next))
  }

  function next(): void {
    if (phase.value === 'ask') script.show()
    else if (phase.value === 'showing') script.finish()
    else goTo(number.value + 1)
  }

  function back(): void {
    if (phase.value === 'ask') goTo(number.value - 1)
    else script.toScript()
  }

  function reset(): void {
    script.toScript()
    guess.value = null
  }

  return { ...script, scene, guess, guesses, nudge, next, back, goTo, reset }
}

/** What the room said, scene by scene: by a show of hands, or from whoever else sets it. */
function useGuesses(scene: Readonly<Ref<CourseScene>>) {
  const guesses = shallowReactive(new Map<string, number>())
  const guess = computed({
    get: () => guesses.get(scene.value.id) ?? null,
    set: (value) => {
      if (value === null) guesses.delete(scene.value.id)
      else guesses.set(scene.value.id, value)
    },
  })

  /** Moves the guess by steps; the first step begins in the middle. */
  function nudge(steps: number): void {
    guess.value = nudged(scene.value.guess, guess.value, steps)
  }

  return { guess, guesses, nudge }
}

/** One scene: its start, its script, and what was changed by hand. */
function useSceneScript(scene: Readonly<Ref<CourseScene>>) {
  const phase = ref<Phase>('ask')
  const setting = shallowRef<DemoSetting>(scene.value.start)
  const isChanged = ref(false)
  const motion = useSceneMotion()
  const facts = useFacts(() => ({ scene: scene.value, setting: setting.value }))

  /** The scene as the script begins it. */
  function toScript(): void {
    motion.stop()
    setting.value = scene.value.start
    isChanged.value = false
    phase.value = 'ask'
  }

  function show(): void {
    const from = setting.value
    const { legs } = scene.value
    const { answer } = facts.value
    phase.value = 'showing'
    motion.start({
      duration: scriptDuration(legs),
      frame: (seconds) => {
        setting.value = withValues(from, valuesAt(from.values, legs, answer, seconds))
      },
      end: () => (phase.value = 'shown'),
    })
  }

  /** Changes what is on show; a script that runs gives way. */
  function change(changed: Partial<DemoSetting>): void {
    if (phase.value === 'showing') {
      motion.stop()
      phase.value = 'shown'
    }
    setting.value = { ...setting.value, ...changed }
    isChanged.value = true
  }

  const changeValues = (values: Partial<DemoValues>): void =>
    change({ values: { ...setting.value.values, ...values } })

  watch(scene, toScript)
  const { finish } = motion
  return { phase, setting, facts, isChanged, toScript, show, finish, change, changeValues }
}

type FactsOf = Parameters<typeof factsKey>

/** Facts of a scene, kept while only its own figures move. */
function useFacts(source: () => { scene: FactsOf[0]; setting: FactsOf[1] }) {
  const kept = computed<{ key: string; facts: SceneFacts }>((last) => {
    const { scene, setting } = source()
    const key = factsKey(scene, setting)
    return last?.key === key ? last : { key, facts: sceneFacts(scene, setting) }
  })
  return computed(() => kept.value.facts)
}

export type CoursePlayer = ReturnType<typeof useCoursePlayer>
