import { evaluateSection } from '@shared/checks/evaluate-section'
import { bend } from '@shared/calc/line/bend'
import { isWorse } from '@shared/checks/compare'
import { seatCheck } from '@shared/checks/seat-check'
import { LARGEST_CLOSURE_TURN } from '@shared/catalogue/joints'
import type { SectionCase } from '@shared/schemas/section-case'
import { hourNotes } from '@/quick-check/hour-notes'
import type { PartId, PartInput } from './part'

/** A part must be worth at least this share of what is used to be called what governs. Judgement. */
const LEAST_GAIN = 0.05

type Without = readonly [PartId, (section: SectionCase) => SectionCase | null]

/** The case without one of its loads; null where the load does not act. */
const LOADS: readonly Without[] = [
  ['waves', (of) => (of.water.waveHeight > 0 ? inWater(of, { waveHeight: 0 }) : null)],
  ['current', (of) => (of.water.currentSpeed > 0 ? inWater(of, { currentSpeed: 0 }) : null)],
  ['debris', (of) => (of.debris.force > 0 ? { ...of, debris: { ...of.debris, force: 0 } } : null)],
  ['dry', (of) => (of.water.dryDepth > 0 ? inWater(of, { dryDepth: 0 }) : null)],
]

/** An open edge is the safe assumption, and nearly always worth most: it comes after the loads. */
const EDGE: readonly Without[] = [['edge', sealed]]

function inWater(section: SectionCase, change: Partial<SectionCase['water']>): SectionCase {
  return { ...section, water: { ...section.water, ...change } }
}

function sealed(section: SectionCase): SectionCase | null {
  const { model, edgeFactor } = section.uplift
  if (model === 'none' || edgeFactor === 0) return null
  return { ...section, uplift: { ...section.uplift, edgeFactor: 0 } }
}

/**
 * The part that governs: the load without which most would be left, else the skirt edge. Air, where the fabric is strained,
 * the tube gives way, or the night or the day takes the answer away. Null while the case holds with
 * room to spare whatever the hour, or where no part alone makes it better.
 */
export function frontPart(input: PartInput): PartId | null {
  const { section, evaluation, values } = input
  const { verdict, governs, loadedShape } = evaluation
  if (section.barrier.skirtLength === 0) return null
  const givesWay = !loadedShape.solved && loadedShape.reason === 'gives-way'
  if (verdict !== 'holds') {
    if (governs === 'fabric' || givesWay) return 'air'
    const now = evaluation[governs]?.utilisation ?? null
    const best = mostGained(section, now, LOADS) ?? mostGained(section, now, EDGE)
    if (best) return best
  }
  if (verdict !== 'fails' && losesSeat(section)) return 'air'
  if (verdict !== 'fails' && hourNotes(section, evaluation, values).length > 0) return 'air'
  return opensTooFar(input) ? 'bends' : null
}

/** True where a skirt that leaks over a seat that seals would let the tube give way. */
function losesSeat(section: SectionCase): boolean {
  return seatCheck(section)?.givesWay ?? false
}

function mostGained(
  section: SectionCase,
  now: number | null,
  parts: readonly Without[],
): PartId | null {
  let best: PartId | null = null
  let least = now
  for (const [id, without] of parts) {
    const freed = without(section)
    if (!freed) continue
    const { governs, ...checks } = evaluateSection(freed)
    const used = checks[governs]?.utilisation ?? null
    if (isWorse(least, used)) [best, least] = [id, used]
  }
  const isWorthIt = now === null || (least !== null && least <= (1 - LEAST_GAIN) * now)
  return isWorthIt ? best : null
}

/** True where the section holds on a straight line and not beside the bend. */
export function opensTooFar({ section, evaluation, values }: PartInput): boolean {
  if (evaluation.verdict === 'fails' || values.turn === null || values.turn <= 0) return false
  return evaluateSection(section, bendShare(section, values.turn)).verdict === 'fails'
}

/** Share of friction resistance and skirt grip that a bend leaves in each of both sections. */
export function bendShare(section: SectionCase, turn: number): number {
  const { diameter, skirtLength, sectionLength } = section.barrier
  const answer = bend({
    angle: turn,
    diameter,
    skirtLength,
    sectionLength,
    largestTurn: LARGEST_CLOSURE_TURN,
  })
  return Math.max(0, 1 - answer.lostShare)
}
