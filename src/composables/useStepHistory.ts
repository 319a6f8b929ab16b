import { computed, shallowReadonly, shallowRef } from 'vue'

/** Changes of one kind this close together are one step, as while the water is dragged [ms]. */
const TOGETHER = 1000

/** Steps that can be taken back. */
const MOST_STEPS = 200

/**
 * A state of which every change is a step that can be taken back and done again.
 *
 * @param now Clock [ms]; tests bring their own.
 */
export function useStepHistory<State extends object>(
  initial: State,
  now: () => number = () => Date.now(),
) {
  const present = shallowRef<State>(initial)
  const past = shallowRef<readonly State[]>([])
  const future = shallowRef<readonly State[]>([])
  let last = { kind: '', at: -Infinity }

  /** Takes the next state. `kind` names what is changed: the same kind soon after joins the step. */
  function change(next: State, kind: string): void {
    if (next === present.value) return
    const at = now()
    const joins = kind === last.kind && at - last.at < TOGETHER && past.value.length > 0
    if (!joins) past.value = [...past.value, present.value].slice(-MOST_STEPS)
    future.value = []
    present.value = next
    last = { kind, at }
  }

  function undo(): void {
    const before = past.value.at(-1)
    if (!before) return
    past.value = past.value.slice(0, -1)
    future.value = [present.value, ...future.value]
    present.value = before
    last = { kind: '', at: -Infinity }
  }

  function redo(): void {
    const [after, ...rest] = future.value
    if (!after) return
    past.value = [...past.value, present.value]
    future.value = rest
    present.value = after
    last = { kind: '', at: -Infinity }
  }

  /** Begins anew from a state that came from elsewhere. */
  function restart(state: State): void {
    past.value = []
    future.value = []
    present.value = state
    last = { kind: '', at: -Infinity }
  }

  return {
    present: shallowReadonly(present),
    canUndo: computed(() => past.value.length > 0),
    canRedo: computed(() => future.value.length > 0),
    change,
    undo,
    redo,
    restart,
  }
}

export type StepHistory<State extends object> = ReturnType<typeof useStepHistory<State>>
