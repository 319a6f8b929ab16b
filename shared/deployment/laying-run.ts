/** What laying one section takes a pair, in the order of the work. */
export interface LayingJob {
  /** Everything before filling [s]. */
  readonly before: number
  /** Filling, for which a blower is needed [s]. */
  readonly fill: number
  /** Everything after filling [s]. */
  readonly after: number
}

/** When the pairs and the blowers can begin [s since 1970]. */
export interface LayingForce {
  readonly pairs: readonly number[]
  readonly blowers: readonly number[]
}

/** How one section was laid [s since 1970]. */
export interface LaidJob {
  /** Place of the job in the list of jobs. */
  readonly job: number
  /** Places of the pair and the blower, from 0. */
  readonly pair: number
  readonly blower: number
  readonly start: number
  readonly fillFrom: number
  readonly fillTo: number
  readonly finish: number
  /** Wait for a blower [s]. */
  readonly waited: number
}

/** A section that a pair has begun and that is not filled yet. */
interface OpenJob {
  readonly job: number
  readonly pair: number
  readonly start: number
  /** When the blower is wanted. */
  readonly wants: number
}

/** Work on a line at the moment at which the next section is handed out. */
export interface LayingState {
  /** When each pair is free; infinite while its section waits to be filled. */
  readonly pairs: readonly number[]
  readonly blowers: readonly number[]
  /** By the moment at which they want a blower. */
  readonly open: readonly OpenJob[]
  /** Sections whose end became known with the last step, in the order in which they were filled. */
  readonly laid: readonly LaidJob[]
}

/** Nobody has begun. */
export function layingBegins({ pairs, blowers }: LayingForce): LayingState {
  return { pairs, blowers, open: [], laid: [] }
}

/**
 * Hands the next section to the pair that is free first, the one with the lower number among equals.
 * Blowers are handed out in the order in which they are wanted; only filling waits for one.
 */
export function handOut(state: LayingState, job: number, jobs: readonly LayingJob[]): LayingState {
  const ready = filled({ ...state, laid: [] }, jobs)
  const start = Math.min(...ready.pairs)
  const pair = ready.pairs.indexOf(start)
  const opened = { job, pair, start, wants: start + jobs[job]!.before }
  const later = ready.open.findIndex(({ wants }) => wants > opened.wants)
  const at = later < 0 ? ready.open.length : later
  return {
    ...ready,
    pairs: ready.pairs.map((free, i) => (i === pair ? Infinity : free)),
    open: [...ready.open.slice(0, at), opened, ...ready.open.slice(at)],
  }
}

/** The end of the work once everything is handed out. */
export function finished(state: LayingState, jobs: readonly LayingJob[]): LayingState {
  let ready: LayingState = { ...state, laid: [] }
  while (ready.open.length > 0) ready = firstFilled(ready, jobs)
  return ready
}

/**
 * Lays sections in an order: each pair takes the next one as soon as it is free, and does its steps
 * one after another.
 *
 * @param order Places in `jobs`, each once.
 * @returns In the order of laying.
 * @see Method page, "Deployment".
 */
export function layInOrder(
  order: readonly number[],
  jobs: readonly LayingJob[],
  force: LayingForce,
): readonly LaidJob[] {
  const byJob = new Map<number, LaidJob>()
  const keep = (state: LayingState): LayingState => {
    for (const laid of state.laid) byJob.set(laid.job, laid)
    return state
  }
  const handed = order.reduce((state, job) => keep(handOut(state, job, jobs)), layingBegins(force))
  keep(finished(handed, jobs))
  return order.map((job) => byJob.get(job)!)
}

/** Fills what wants a blower before anybody can take the next section. */
function filled(state: LayingState, jobs: readonly LayingJob[]): LayingState {
  let ready = state
  while (ready.open.length > 0 && ready.open[0]!.wants <= Math.min(...ready.pairs)) {
    ready = firstFilled(ready, jobs)
  }
  return ready
}

function firstFilled(state: LayingState, jobs: readonly LayingJob[]): LayingState {
  const [{ job, pair, start, wants }, ...open] = state.open as [OpenJob, ...OpenJob[]]
  const blower = nextBlower(state.blowers, wants)
  const fillFrom = Math.max(wants, state.blowers[blower]!)
  const fillTo = fillFrom + jobs[job]!.fill
  const finish = fillTo + jobs[job]!.after
  const waited = fillFrom - wants
  return {
    pairs: state.pairs.map((free, i) => (i === pair ? finish : free)),
    blowers: state.blowers.map((free, i) => (i === blower ? fillTo : free)),
    open,
    laid: [...state.laid, { job, pair, blower, start, fillFrom, fillTo, finish, waited }],
  }
}

/** The first blower that is free by then, or else the one that is free first. */
function nextBlower(blowers: readonly number[], wanted: number): number {
  const free = blowers.findIndex((at) => at <= wanted)
  return free >= 0 ? free : blowers.indexOf(Math.min(...blowers))
}
