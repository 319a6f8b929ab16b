import { bend, stepArea } from '../../calc/line/bend'
import { lineSections, type LineSection } from '../../calc/line/line-sections'
import { LARGEST_CLOSURE_TURN } from '../../catalogue/joints'
import { EDGE_WORK, sectionTime } from '../../catalogue/laying-times'
import type { Survey } from '../../schemas/line-faults'
import type { LineEnds } from '../../schemas/mark'
import type { ScenarioContent, SizeRun } from '../../schemas/scenario'
import { sizeAt } from '../place-case'
import { CHANGE_MASS } from './choose-sizes'

/** Where two sections meet. */
export interface LineJoint {
  readonly chainage: number
  /** Turn, positive to the left, away from the water [rad]. */
  readonly angle: number
  /** Closures that share the turn equally. */
  readonly closures: number
  /** Outer gap at one closure [m]. */
  readonly outerGap: number
  /** Skirt that is missing where the turn opens it [m²]. */
  readonly missingSkirt: number
  /** Area that is left to close between two sizes [m²]; 0 between equal ones. */
  readonly stepArea: number
}

/** Tubes of one size on a line. */
export interface TubeCount {
  /** Catalogue id; null for a tube with figures of its own. */
  readonly barrierId: string | null
  readonly name: string
  readonly diameter: number
  readonly count: number
}

/** Everything that a layout needs, and what it costs to lay. */
export interface LayoutBill {
  readonly sections: number
  readonly tubes: readonly TubeCount[]
  readonly joints: readonly LineJoint[]
  /** Closures of all joints and of ends that are closed. */
  readonly closures: number
  readonly changes: number
  /** Skirt that is missing at all bends [m²]. */
  readonly missingSkirt: number
  /** Mass of the tubes as they are carried [kg]. */
  readonly mass: number
  /** Σ mass + 20 kg × changes, which the best layout has least of [kg]. */
  readonly weight: number
  /** Edge that is weighed or sealed [m], and the bags for it. */
  readonly edgeLength: number
  readonly edgeBags: number
  /** Time of one crew for everything but clearing the line [s]. */
  readonly crewTime: number
}

/** What is laid in one section. */
export interface LaidSection {
  readonly section: LineSection
  readonly run: SizeRun | null
}

/** What a scenario lays, section by section. */
export function laidSections(survey: Survey, content: ScenarioContent): readonly LaidSection[] {
  return lineSections(survey.stations, survey.sectionLength, survey.marks).map((section) => ({
    section,
    run: sizeAt(content, (section.from + section.to) / 2),
  }))
}

/**
 * The bill of a layout.
 *
 * @param ends Ends of the line; each that is closed takes a closure.
 */
export function layoutBill(
  survey: Survey & { readonly ends?: LineEnds },
  content: ScenarioContent,
): LayoutBill {
  const { sectionLength, ends } = survey
  const laid = laidSections(survey, content)
  const joints = jointsOf(laid, sectionLength)
  const runs = laid.flatMap(({ run }) => run ?? [])
  const mass = runs.reduce((sum, { barrier }) => sum + barrier.mass * sectionLength, 0)
  const changes = joints.filter((joint) => joint.stepArea > 0).length
  const edges = runs.map((run) => edgeCost(run, content, sectionLength))
  const closed = ends ? [ends.start, ends.end].filter(({ kind }) => kind === 'closure').length : 0
  const laying = runs.reduce((sum, { barrier }) => sum + sectionTime(barrier.diameter), 0)
  return {
    sections: laid.length,
    tubes: tubesOf(runs),
    joints,
    closures: joints.reduce((sum, joint) => sum + joint.closures, 0) + closed,
    changes,
    missingSkirt: joints.reduce((sum, joint) => sum + joint.missingSkirt, 0),
    mass,
    weight: mass + CHANGE_MASS * changes,
    edgeLength: edges.filter(({ bags }) => bags > 0).length * sectionLength,
    edgeBags: edges.reduce((sum, { bags }) => sum + bags, 0),
    crewTime: laying + edges.reduce((sum, { time }) => sum + time, 0),
  }
}

/** Bags and time for the edge of one section [–, s]; none where the edge is left open. */
export function edgeCost(
  { edgeFactor }: Pick<SizeRun, 'edgeFactor'>,
  { uplift }: Pick<ScenarioContent, 'uplift'>,
  sectionLength: number,
): { readonly bags: number; readonly time: number } {
  const open = uplift.model === 'none' ? 0 : (edgeFactor ?? uplift.edgeFactor)
  if (open >= 1) return { bags: 0, time: 0 }
  const bags = Math.ceil(EDGE_WORK.bagsPerMetre * sectionLength)
  return { bags, time: bags * EDGE_WORK.timePerBag * (open === 0 ? EDGE_WORK.sealing : 1) }
}

function jointsOf(laid: readonly LaidSection[], sectionLength: number): readonly LineJoint[] {
  return laid.slice(1).flatMap(({ section, run }, i): LineJoint[] => {
    const before = laid[i]!.run
    if (!run || !before) return []
    const [a, b] = [before.barrier, run.barrier]
    const answer = bend({
      angle: section.turnAtStart,
      diameter: Math.max(a.diameter, b.diameter),
      skirtLength: Math.max(a.skirtLength, b.skirtLength),
      sectionLength,
      largestTurn: LARGEST_CLOSURE_TURN,
    })
    return [
      {
        chainage: section.from,
        angle: section.turnAtStart,
        closures: answer.closures,
        outerGap: answer.outerGap,
        missingSkirt: answer.missingSkirt,
        stepArea: stepArea(Math.max(a.diameter, b.diameter), Math.min(a.diameter, b.diameter)),
      },
    ]
  })
}

function tubesOf(runs: readonly SizeRun[]): readonly TubeCount[] {
  const counts = new Map<string, TubeCount>()
  for (const { barrier } of runs) {
    const { catalogueId: barrierId, name, diameter } = barrier
    const key = barrierId ?? `${name}|${diameter}`
    const count = (counts.get(key)?.count ?? 0) + 1
    counts.set(key, { barrierId, name, diameter, count })
  }
  return [...counts.values()].sort((a, b) => a.diameter - b.diameter)
}
