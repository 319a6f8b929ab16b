import type { PlannedLaying } from '../schemas/deployment'
import type { ForecastBand } from '../schemas/forecast'
import { byBand, moment, type Deadlines } from './groundwork'
import type { SectionWork } from './laying-jobs'
import type { LaidJob } from './laying-run'
import { sectionBallast, type BallastInput } from './wind-ballast'

interface LayingParts {
  readonly position: number
  readonly work: SectionWork
  readonly deadlines: Deadlines
  readonly wind: BallastInput | null
}

/** One section of the plan, step by step. */
export function plannedLaying(laid: LaidJob, parts: LayingParts): PlannedLaying {
  const { position, work, deadlines, wind } = parts
  const { section, run, lowest } = work
  const { name, diameter, catalogueId } = run.barrier
  const comes = (band: ForecastBand) => deadlines[band][laid.job]!
  return {
    position,
    from: section.from,
    to: section.to,
    barrier: { name, diameter, catalogueId },
    edgeFactor: run.edgeFactor,
    edgeBags: work.edgeBags,
    lowestGround: lowest.lowestGround,
    lowestAt: lowest.lowestAt,
    pair: laid.pair + 1,
    blower: laid.blower + 1,
    start: moment(laid.start),
    finish: moment(laid.finish),
    steps: stepsOf(laid, work),
    deadline: byBand((band) => (comes(band) < Infinity ? moment(comes(band)) : null)),
    margin: byBand((band) => (comes(band) < Infinity ? comes(band) - laid.finish : null)),
    ballast: wind && sectionBallast(work, wind),
  }
}

function stepsOf({ start, fillFrom, waited }: LaidJob, { steps }: SectionWork) {
  let at = start
  return steps.map(({ step, time }) => {
    const isFill = step === 'fill'
    const from = isFill ? fillFrom : at
    at = from + time
    return { step, from: moment(from), to: moment(at), waited: isFill ? waited : 0 }
  })
}
