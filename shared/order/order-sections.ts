import { edgeCost, type LaidSection } from '../checks/layout/layout-bill'
import type { SectionAnswer } from '../checks/line-check'
import type { DeploymentPlan, PlannedLaying } from '../schemas/deployment'
import type { OrderSection } from '../schemas/order'
import type { ScenarioContent } from '../schemas/scenario'

/** Chainages closer than this are one place [m]. */
const SAME_PLACE = 1e-6

interface Laying {
  readonly content: ScenarioContent
  readonly sectionLength: number
  readonly laid: readonly LaidSection[]
  readonly answers: readonly SectionAnswer[]
  readonly plan: DeploymentPlan | null
}

/** What is laid, in the order of the plan; without one from the lower chainage on, without times. */
export function orderSections(laying: Laying): readonly OrderSection[] {
  const { laid, plan } = laying
  const sections = laid.flatMap(({ run }, i) => (run ? [sectionAt(laying, i)] : []))
  const planned = plan?.sections ?? []
  const placeOf = (section: OrderSection) => plannedAt(planned, section)?.position ?? Infinity
  return sections
    .sort((a, b) => placeOf(a) - placeOf(b) || a.from - b.from)
    .map((section, i) => ({ ...section, position: i + 1 }))
}

function plannedAt(planned: readonly PlannedLaying[], { from }: { readonly from: number }) {
  return planned.find((section) => Math.abs(section.from - from) < SAME_PLACE)
}

function sectionAt(laying: Laying, i: number): OrderSection {
  const { content, sectionLength, laid, answers, plan } = laying
  const { section, run } = laid[i]!
  const { barrier } = run!
  const planned = plannedAt(plan?.sections ?? [], section)
  return {
    position: i + 1,
    from: section.from,
    to: section.to,
    tube: barrier.name,
    diameter: barrier.diameter,
    edgeBags: planned?.edgeBags ?? edgeCost(run!, content, sectionLength).bags,
    ballast: planned?.ballast?.mass ?? null,
    ballastBags: planned?.ballast?.bags ?? null,
    turn: section.turnAtStart,
    ...timesOf(planned, plan),
    verdict: answers[i]!.verdict,
  }
}

function timesOf(planned: PlannedLaying | undefined, plan: DeploymentPlan | null) {
  if (!planned || !plan) {
    return { pair: null, start: null, finish: null, deadline: null, margin: null }
  }
  const { pair, start, finish, deadline, margin } = planned
  const band = plan.judgedBy
  return { pair, start, finish, deadline: deadline[band], margin: margin[band] }
}

/** Stretches that nobody lays: sections without a size, joined where they touch. */
export function unlaidStretches(laid: readonly LaidSection[]) {
  const stretches: { from: number; to: number }[] = []
  for (const { section, run } of laid) {
    if (run) continue
    const before = stretches.at(-1)
    if (before && Math.abs(before.to - section.from) < SAME_PLACE) before.to = section.to
    else stretches.push({ from: section.from, to: section.to })
  }
  return stretches
}
