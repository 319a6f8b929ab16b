import { computed, ref } from 'vue'
import { bestLayout, runsOfLayout, type BestLayout } from '@shared/checks/layout/best-layout'
import { layoutBill } from '@shared/checks/layout/layout-bill'
import type { Line } from '@shared/schemas/project'
import type { ScenarioBarrier, ScenarioContent, SizeRun } from '@shared/schemas/scenario'
import { useDeferred } from './useDeferred'

/** Which level the layout is made for. */
export type LayoutLevel = 'expected' | 'low' | 'high'

interface Asked {
  readonly line: Line
  readonly content: ScenarioContent
  readonly sizes: readonly ScenarioBarrier[]
}

/** The best layout, and what it needs. */
export interface LayoutPlan {
  readonly layout: BestLayout
  readonly runs: readonly SizeRun[]
  readonly bill: ReturnType<typeof layoutBill>
}

function planOf({ line, content, sizes }: Asked): LayoutPlan {
  const layout = bestLayout(line, content, sizes)
  const runs = runsOfLayout(layout, content)
  return { layout, runs, bill: layoutBill(line, { ...content, sizes: [...runs] }) }
}

/** The best layout of a scenario at the level that is chosen, worked out once things have settled. */
export function useLayoutPlan(
  line: () => Line,
  content: () => ScenarioContent,
  sizes: () => readonly ScenarioBarrier[],
) {
  const level = ref<LayoutLevel>('expected')
  const levels = computed(() => {
    const { waterLevel, levelLow, levelHigh } = content()
    return {
      expected: waterLevel,
      ...(typeof levelLow === 'number' ? { low: levelLow } : {}),
      ...(typeof levelHigh === 'number' ? { high: levelHigh } : {}),
    } as Record<LayoutLevel, number | undefined>
  })
  const waterLevel = computed(() => levels.value[level.value] ?? content().waterLevel)
  const { result, isPending } = useDeferred(
    () => ({
      line: line(),
      content: { ...content(), waterLevel: waterLevel.value },
      sizes: sizes(),
    }),
    planOf,
    null,
  )
  return { plan: result, isPending, level, levels, waterLevel }
}
