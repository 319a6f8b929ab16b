import { computed, ref, watch, type Ref } from 'vue'
import { planScene, type PlanInput, type PlanWindow } from '@shared/drawing/plan'
import type { Point, View } from '@shared/drawing/scene'
import { measureWith } from '@shared/drawing/text-width'
import { movedBy, zoomedAround } from '@/line/plan-window'
import { useWords } from './useWords'

export type DrawnPlan = Omit<PlanInput, 'view' | 'window' | 'measure'>

/** Px that an arrow key moves a plan, and how far a key zooms. */
const STEP = 60
const FACTOR = 1.5

/** A plan with what it shows of the grid: zoomed around a point, moved, or all of the line. */
export function usePlanView(drawn: () => DrawnPlan, size: Readonly<Ref<View | null>>) {
  const { say } = useWords()
  const window = ref<PlanWindow | null>(null)
  const sceneOf = (part: PlanWindow | null) =>
    size.value &&
    planScene({ ...drawn(), window: part, view: size.value, measure: measureWith(say) })
  const whole = computed(() => sceneOf(null))
  const scene = computed(() => sceneOf(window.value))

  function zoomAround(point: Point, factor: number): void {
    if (!scene.value || !whole.value || !size.value) return
    const around = { point, factor, whole: whole.value.frame.scale, view: size.value }
    window.value = zoomedAround(scene.value.frame, around)
  }
  function zoomMiddle(factor: number): void {
    if (size.value) zoomAround({ x: size.value.width / 2, y: size.value.height / 2 }, factor)
  }
  function moveBy(x: number, y: number): void {
    if (scene.value && size.value) window.value = movedBy(scene.value.frame, { x, y }, size.value)
  }
  function fit(): void {
    window.value = null
  }

  const keys = new Map<string, () => void>([
    ['ArrowLeft', () => moveBy(STEP, 0)],
    ['ArrowRight', () => moveBy(-STEP, 0)],
    ['ArrowUp', () => moveBy(0, STEP)],
    ['ArrowDown', () => moveBy(0, -STEP)],
    ['+', () => zoomMiddle(FACTOR)],
    ['=', () => zoomMiddle(FACTOR)],
    ['-', () => zoomMiddle(1 / FACTOR)],
    ['0', fit],
  ])
  /** True where the key was for the plan. */
  function takeKey(key: string): boolean {
    const run = keys.get(key)
    run?.()
    return run !== undefined
  }

  watch(() => drawn().stations, fit)
  return { scene, window, zoomAround, zoomMiddle, moveBy, fit, takeKey }
}
