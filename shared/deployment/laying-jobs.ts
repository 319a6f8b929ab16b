import { edgeCost, laidSections, type LaidSection } from '../checks/layout/layout-bill'
import { EDGE_WORK, LAYING_STEPS, stepTimes, type StepTimes } from '../catalogue/laying-times'
import type { LineSection, SectionPiece } from '../calc/line/line-sections'
import type { DeploymentSettings, PlanStep } from '../schemas/deployment'
import type { Survey } from '../schemas/line-faults'
import type { ScenarioContent, SizeRun } from '../schemas/scenario'
import type { LayingJob } from './laying-run'

/** One step and how long a pair needs for it [s]. */
export interface TimedStep {
  readonly step: PlanStep
  readonly time: number
}

/** A section that is laid, and what that takes. */
export interface SectionWork extends LayingJob {
  readonly section: LineSection
  readonly run: SizeRun
  /** Where its ground is lowest. */
  readonly lowest: SectionPiece
  readonly steps: readonly TimedStep[]
  readonly edgeBags: number
}

export interface LineWorkPlan {
  /** In order of chainage. */
  readonly works: readonly SectionWork[]
  /** Sections without a size. */
  readonly unlaid: readonly LineSection[]
}

type TimeSettings = Pick<DeploymentSettings, 'sizeTimes' | 'edgeBagTime'>

/** What laying a scenario's sizes takes, section by section. */
export function lineWorkPlan(
  survey: Survey,
  content: ScenarioContent,
  settings: TimeSettings,
): LineWorkPlan {
  const laid = laidSections(survey, content)
  const works = laid.flatMap((one) => {
    const { run } = one
    return run ? [sectionWork({ ...one, run }, content, { survey, settings })] : []
  })
  return { works, unlaid: laid.flatMap(({ section, run }) => (run ? [] : section)) }
}

/** Diameters this close are one [m]. */
const SAME_DIAMETER = 0.001

/** Times of a size: as they are set, or else those of the catalogue [s]. */
export function timesOfSize(
  diameter: number,
  { sizeTimes }: Pick<DeploymentSettings, 'sizeTimes'>,
): StepTimes {
  const own = sizeTimes.find((size) => Math.abs(size.diameter - diameter) < SAME_DIAMETER)
  return own?.times ?? stepTimes(diameter)
}

function sectionWork(
  { section, run }: LaidSection & { readonly run: SizeRun },
  content: ScenarioContent,
  { survey, settings }: { readonly survey: Survey; readonly settings: TimeSettings },
): SectionWork {
  const times = timesOfSize(run.barrier.diameter, settings)
  const { bags, time } = edgeCost(run, content, survey.sectionLength)
  const edge = (time / EDGE_WORK.timePerBag) * settings.edgeBagTime
  const steps: TimedStep[] = LAYING_STEPS.map((step) => ({ step, time: times[step] }))
  if (bags > 0) steps.push({ step: 'edge', time: edge })
  const at = LAYING_STEPS.indexOf('fill')
  const sum = (some: readonly TimedStep[]) => some.reduce((total, { time: t }) => total + t, 0)
  return {
    section,
    run,
    lowest: section.pieces.reduce((a, b) => (b.lowestGround < a.lowestGround ? b : a)),
    steps,
    edgeBags: bags,
    before: sum(steps.slice(0, at)),
    fill: times.fill,
    after: sum(steps.slice(at + 1)),
  }
}
