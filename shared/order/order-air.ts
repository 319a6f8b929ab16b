import { minimumAirPressure } from '../calc/air/minimum-air-pressure'
import type { LineSection } from '../calc/line/line-sections'
import { sectionGeometry } from '../calc/section/section-geometry'
import { checkBasis } from '../catalogue/check-bases'
import { waterAllowance } from '../checks/freeboard-check'
import type { LaidSection } from '../checks/layout/layout-bill'
import type { SectionAnswer } from '../checks/line-check'
import { assumptionOf, caseAt } from '../checks/place-case'
import type { Order } from '../schemas/order'
import type { ScenarioBarrier, ScenarioContent, SizeRun } from '../schemas/scenario'

/** Partial factors of action and of fabric. EN 1997-1 Annex A for the first; the second common practice. */
const PARTIAL_FABRIC = 1.35 * 3

interface LaidRun {
  readonly section: LineSection
  readonly run: SizeRun
  readonly answer: SectionAnswer
}

/** How hard each size is filled: the pressure of the scenario, the least and the most. */
export function orderAir(
  content: ScenarioContent,
  laid: readonly LaidSection[],
  answers: readonly SectionAnswer[],
): Order['air'] {
  const sizes = new Map<string, LaidRun[]>()
  laid.forEach(({ section, run }, i) => {
    if (!run) return
    const key = `${run.barrier.name}|${run.barrier.diameter}|${run.barrier.airPressure}`
    sizes.set(key, [...(sizes.get(key) ?? []), { section, run, answer: answers[i]! }])
  })
  return [...sizes.values()]
    .map((runs) => {
      const { barrier } = runs[0]!.run
      const demands = runs.flatMap((run) => leastPressure(content, run) ?? [])
      return {
        tube: barrier.name,
        diameter: barrier.diameter,
        pieces: runs.length,
        fill: barrier.airPressure,
        least: demands.length === 0 ? null : Math.max(...demands),
        most: mostPressure(barrier, content.basis),
      }
    })
    .sort((a, b) => a.diameter - b.diameter)
}

/**
 * Least pressure of a section at the level that is checked, or at the one to which it holds where that
 * is lower [Pa]; null where no water stands at it or it does not hold at all.
 */
function leastPressure(content: ScenarioContent, { section, run, answer }: LaidRun): number | null {
  if (answer.holdsToLevel === null || run.barrier.skirtLength === 0) return null
  const waterLevel = Math.min(content.waterLevel, answer.holdsToLevel)
  const { lowestGround, lowestAt, surface } = section.pieces.reduce((a, b) =>
    b.lowestGround < a.lowestGround ? b : a,
  )
  const ground = assumptionOf(content, surface)
  if (!ground || waterLevel <= lowestGround) return null
  const place = { chainage: lowestAt, groundLevel: lowestGround, surface }
  const here = caseAt({ ...content, waterLevel }, place, run, ground)
  const { wettedSkirt, unitWeight, depth } = sectionGeometry(here)
  return minimumAirPressure({
    ...{ diameter: here.barrier.diameter, wettedSkirt, depth, unitWeight },
    freeboard: here.requiredFreeboard + waterAllowance({ section: here }),
  }).least
}

/**
 * Highest pressure that the gauge may ever show [Pa], filled cold or warmed by the sun: that whose
 * tension in the skin of the unloaded tube, T = p D/2, the fabric takes with its required factor. Null
 * where the strength is not known.
 */
export function mostPressure(
  { diameter, fabricStrength }: Pick<ScenarioBarrier, 'diameter' | 'fabricStrength'>,
  basisId: ScenarioContent['basis'],
): number | null {
  if (fabricStrength === null) return null
  const basis = checkBasis(basisId)
  const required = basis.format === 'partial' ? PARTIAL_FABRIC : basis.fabric
  return (2 * fabricStrength) / (required * diameter)
}
