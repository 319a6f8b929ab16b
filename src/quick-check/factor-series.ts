import { evaluateSection } from '@shared/checks/evaluate-section'
import { EDGE_FACTORS, edgeFactorsOf } from '@shared/checks/what-decides'
import type { FactorPoint, FactorSeries } from '@shared/drawing/factor-chart'
import type { SectionCase } from '@shared/schemas/section-case'
import type { Message } from '@shared/texts/format-text'

/** Depths of a curve, up to one diameter; fine enough that a chord leaves the curve by less than a pixel. */
const POINTS = 48

/** Sliding factor against depth: the case as it is, and with its skirt edge sealed, or open if it is sealed. */
export function factorSeries(section: SectionCase): readonly FactorSeries[] {
  const { model, edgeFactor } = section.uplift
  const chosen: FactorSeries = {
    id: 'chosen',
    label: model === 'none' ? { key: 'quickCheck.chart.series.none' } : edgeLabel(section.uplift),
    style: 'chosen',
    points: factorPoints(section),
  }
  if (model === 'none') return [chosen]
  const other = edgeFactor === EDGE_FACTORS.sealed ? EDGE_FACTORS.open : EDGE_FACTORS.sealed
  const uplift = { ...section.uplift, edgeFactor: other }
  const points = factorPoints({ ...section, uplift })
  return [chosen, { id: 'other-edge', label: edgeLabel(uplift), style: 'alternative', points }]
}

function factorPoints(section: SectionCase): readonly FactorPoint[] {
  return Array.from({ length: POINTS }, (_, index) => {
    const depth = (section.barrier.diameter * (index + 1)) / POINTS
    const { factor } = evaluateSection({ ...section, water: { ...section.water, depth } }).sliding
    return { depth, factor }
  })
}

function edgeLabel(uplift: SectionCase['uplift']): Message {
  const { edgeFactor } = uplift
  const named = Object.entries(edgeFactorsOf(uplift)).find(([, factor]) => factor === edgeFactor)
  if (named) return { key: `quickCheck.chart.series.${named[0]}` }
  const values = { share: { value: edgeFactor, kind: 'percent' as const } }
  return { key: 'quickCheck.chart.series.typed', values }
}
