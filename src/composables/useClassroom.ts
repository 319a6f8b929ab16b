import { computed, onScopeDispose, shallowReadonly, shallowRef, watch, type ShallowRef } from 'vue'
import { GUESS_UNITS, type ClassState } from '@shared/schemas/class'
import { fetchClass, followClass, sendGuess } from '@/api/classes'
import { ApiError } from '@/api/request'
import { keptGuesses } from './kept-guesses'

/** Until a guess that did not arrive is sent again, while the line looks up [ms]. */
const AGAIN = 2500

/** A phone in a class: follows the trainer, and keeps its guess until there is signal. */
export function useClassroom(code: string) {
  const state = shallowRef<ClassState | null>(null)
  const problem = shallowRef<ApiError | null>(null)
  const isUp = shallowRef(true)
  const own = useOwnGuess(code, { state, isUp })

  function take(next: ClassState): void {
    state.value = next
    problem.value = null
    void own.deliver()
  }

  /** A stream does not say why it was refused, so the first question is asked by itself. */
  async function enter(): Promise<void> {
    try {
      take(await fetchClass(code))
    } catch (error) {
      if (!(error instanceof ApiError)) throw error
      if (error.isOffline) isUp.value = false
      else problem.value = error
    }
  }

  void enter()
  const stop = followClass(code, own.participant, {
    state: take,
    line: (next) => {
      isUp.value = next
      if (next) void own.deliver()
    },
  })
  const isOver = computed(
    () =>
      problem.value?.code === 'not-found' ||
      (state.value !== null && state.value.status !== 'open'),
  )
  watch(isOver, (now) => now && stop())
  onScopeDispose(stop)

  const { guess, give, isLate } = own
  return {
    state: shallowReadonly(state),
    problem: shallowReadonly(problem),
    isUp: shallowReadonly(isUp),
    ...{ isLate, guess, give },
  }
}

interface Line {
  readonly state: Readonly<ShallowRef<ClassState | null>>
  readonly isUp: ShallowRef<boolean>
}

/** The guess of this phone in the scene that is on, sent until the server has it. */
function useOwnGuess(code: string, { state, isUp }: Line) {
  const isLate = shallowRef(false)
  const { kept, put } = keptGuesses(code)
  const key = computed(() => {
    const scene = state.value?.scene
    return scene ? `${scene.course}/${scene.scene}` : null
  })
  const guess = computed(() => (key.value ? (kept.value.guesses[key.value] ?? null) : null))
  watch(key, () => (isLate.value = false))

  let timer = 0
  let isSending = false
  onScopeDispose(() => window.clearTimeout(timer))

  /** Sends what the server does not have yet; what comes too late is dropped. */
  async function deliver(): Promise<void> {
    const [at, own, scene] = [key.value, guess.value, state.value?.scene]
    if (isSending || at === null || !own || own.isSent || scene?.phase !== 'question') return
    isSending = true
    window.clearTimeout(timer)
    const unit = GUESS_UNITS[scene.guess.kind]
    const { participant } = kept.value
    try {
      await sendGuess(code, { participant, scene: scene.scene, value: own.value, unit })
      isUp.value = true
      if (kept.value.guesses[at]?.value === own.value) put(at, { ...own, isSent: true })
    } catch (error) {
      refused(error, at)
    }
    isSending = false
    if (guess.value && !guess.value.isSent) timer = window.setTimeout(() => void deliver(), AGAIN)
  }

  function refused(error: unknown, at: string): void {
    if (!(error instanceof ApiError)) throw error
    if (error.isOffline) isUp.value = false
    if (error.code !== 'conflict') return
    isLate.value = true
    put(at, null)
  }

  function give(value: number): void {
    if (key.value === null) return
    put(key.value, { value, isSent: false })
    void deliver()
  }

  return {
    isLate: shallowReadonly(isLate),
    guess,
    give,
    deliver,
    participant: kept.value.participant,
  }
}
