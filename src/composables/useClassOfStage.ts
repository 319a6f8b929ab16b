import { computed, onScopeDispose, shallowReadonly, shallowRef, watch } from 'vue'
import type { ClassItem, ClassScene, ClassState } from '@shared/schemas/class'
import { closeClass, fetchOpenClasses, followClass, openClass, tellScene } from '@/api/classes'
import { ApiError } from '@/api/request'
import { useSession } from '@/stores/session'
import { useSubmit } from './useSubmit'

/** Until the scene is told again to a server that did not answer [ms]. */
const AGAIN = 3000

/**
 * The class of a stage: opened by a trainer, told each scene, heard guess by guess.
 *
 * @param scene Where the stage is; told whenever it changes.
 */
export function useClassOfStage(scene: () => ClassScene) {
  const led = useLedClass(scene)
  const { item, state } = led
  const session = useSession()
  const isTrainer = computed(() => session.account?.role === 'trainer')
  const opening = useSubmit(openClass)
  const closing = useSubmit(closeClass)

  /** Guesses of the scene that is on; those of another one are on their way out. */
  const dots = computed(() => {
    const told = state.value?.scene
    const { course, scene: id } = scene()
    return told?.course === course && told.scene === id ? (state.value?.room.dots ?? []) : []
  })

  async function open(): Promise<void> {
    const opened = await opening.submit()
    if (opened) led.lead(opened)
  }

  /** Goes on with the class that a trainer has open, as after a reload. */
  async function find(): Promise<void> {
    const account = await session.load().catch(() => null)
    if (account?.role !== 'trainer') return
    const [newest] = await fetchOpenClasses().catch(() => [])
    if (newest && !item.value) led.lead(newest)
  }

  async function close(): Promise<void> {
    const closed = item.value && (await closing.submit(item.value.code))
    if (closed) led.end(closed)
  }

  const problem = computed(() => opening.problem.value ?? closing.problem.value)
  const isPending = computed(() => opening.isPending.value || closing.isPending.value)
  const { isUp, isOpen } = led
  return { item, state, isUp, isOpen, isTrainer, dots, problem, isPending, open, close, find }
}

/** Follows one class and tells it where the stage is. */
function useLedClass(scene: () => ClassScene) {
  const item = shallowRef<ClassItem | null>(null)
  const state = shallowRef<ClassState | null>(null)
  const isUp = shallowRef(true)
  let stop: () => void = () => undefined
  let timer = 0
  const isOpen = computed(() => item.value !== null && (state.value?.status ?? 'open') === 'open')

  async function tell(): Promise<void> {
    window.clearTimeout(timer)
    if (!item.value || !isOpen.value) return
    try {
      state.value = await tellScene(item.value.code, scene())
    } catch (error) {
      if (!(error instanceof ApiError)) throw error
      if (error.isOffline) timer = window.setTimeout(() => void tell(), AGAIN)
    }
  }

  function lead(opened: ClassItem): void {
    item.value = opened
    state.value = null
    stop()
    stop = followClass(opened.code, null, {
      state: (next) => (state.value = next),
      line: (next) => (isUp.value = next),
    })
    void tell()
  }

  function end(closed: ClassState): void {
    state.value = closed
    stop()
  }

  watch(
    () => JSON.stringify(scene()),
    () => void tell(),
  )
  onScopeDispose(() => {
    window.clearTimeout(timer)
    stop()
  })
  const shown = { item: shallowReadonly(item), state: shallowReadonly(state) }
  return { ...shown, isUp: shallowReadonly(isUp), isOpen, lead, end }
}

export type ClassOfStage = ReturnType<typeof useClassOfStage>
