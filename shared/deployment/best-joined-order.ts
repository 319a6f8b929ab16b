import { fromOneEnd, outward, type OrderedSection } from './laying-orders'
import { finished, handOut, layInOrder, layingBegins } from './laying-run'
import type { LayingForce, LayingJob, LayingState } from './laying-run'
import { leastMargin } from './worst-margin'

export interface JoinedOrderInput {
  readonly sections: readonly OrderedSection[]
  readonly jobs: readonly LayingJob[]
  readonly force: LayingForce
}

export interface JoinedOrder {
  readonly order: readonly number[]
  /** Least margin [s]; infinite where the water comes to no section. */
  readonly margin: number
  /** No joined order is better: nothing was left out of the search. */
  readonly isProven: boolean
}

/** Sections handed out in the whole search; keeps it well under a second. */
const MOST_TRIALS = 8000

/** Sections handed out in the outward orders that are tried before the search. */
const MOST_HANDED_OUT = 16_000

/** Longer lines are laid in the best of the orders that are tried first. */
const MOST_SEARCHED = 400

/** A gain below this is none [s]. */
const SAME_MARGIN = 1e-6

/**
 * The joined order with the largest worst margin: what is laid is one run at every moment, so that each
 * next section lies at one of its two ends.
 *
 * @remarks Both ends and outward from many sections are tried first. Then all joined orders are
 * followed side by side, one section at a time; dropped are those whose worst margin cannot become
 * larger than the best found, and of two that have come to the same the one with the smaller margin.
 * Where more are left than can be followed, those that look best go on, and the answer is the best
 * found, not proven; on lines of more than 400 sections it is the best of those tried first.
 */
export function bestJoinedOrder(input: JoinedOrderInput): JoinedOrder {
  const deadlines = input.sections.map(({ deadline }) => deadline)
  const simple = bestSimple(input, deadlines)
  if (simple.margin === Infinity) return { ...simple, isProven: true }
  if (input.jobs.length > MOST_SEARCHED) return { ...simple, isProven: false }
  const width = Math.floor(MOST_TRIALS / (2 * input.jobs.length))
  const search = { ...input, deadlines, byDeadline: placesByDeadline(deadlines), width }
  const found = followed(search, simple.margin)
  return found.order
    ? { order: found.order, margin: found.margin, isProven: found.isWhole }
    : { ...simple, isProven: found.isWhole }
}

type Simple = Omit<JoinedOrder, 'isProven'>

function bestSimple({ sections, jobs, force }: JoinedOrderInput, deadlines: readonly number[]) {
  const count = jobs.length
  const step = Math.max(1, Math.ceil(count ** 2 / MOST_HANDED_OUT))
  const first = deadlines.indexOf(Math.min(...deadlines))
  const starts = [first, ...fromOneEnd(count, 'start').filter((i) => i % step === 0)]
  const orders = [
    fromOneEnd(count, 'start'),
    fromOneEnd(count, 'end'),
    ...starts.map((start) => outward(sections, start)),
  ]
  return orders
    .map((order): Simple => {
      const least = leastMargin(layInOrder(order, jobs, force), deadlines)
      return { order, margin: least?.margin ?? Infinity }
    })
    .reduce((a, b) => (b.margin > a.margin + SAME_MARGIN ? b : a))
}

interface Search extends JoinedOrderInput {
  readonly deadlines: readonly number[]
  readonly byDeadline: readonly number[]
  /** Orders that are followed side by side. */
  readonly width: number
}

/** A joined order so far: sections from `low` to `high` are handed out. */
interface Trial {
  readonly low: number
  readonly high: number
  readonly state: LayingState
  /** Least margin of the sections whose end is known [s]. */
  readonly margin: number
  /** The worst margin cannot become larger than this [s]. */
  readonly bound: number
  readonly job: number
  readonly before: Trial | null
}

function followed(search: Search, least: number) {
  const { jobs, force, width } = search
  let isWhole = true
  let trials = jobs.map((_, job) => begun(search, layingBegins(force), job))
  for (let count = 1; ; count += 1) {
    const open = distinct(trials.filter(({ bound }) => bound > least + SAME_MARGIN))
    if (open.length > width) isWhole = false
    const kept = open.length > width ? open.sort(byBound).slice(0, width) : open
    if (count === jobs.length) return { ...bestOf(search, kept, least), isWhole }
    trials = kept.flatMap((trial) => nextTrials(search, trial))
  }
}

const byBound = (a: Trial, b: Trial): number => b.bound - a.bound

function bestOf(search: Search, trials: readonly Trial[], least: number) {
  let best: { order: readonly number[] | null; margin: number } = { order: null, margin: least }
  for (const trial of trials) {
    const { laid } = finished(trial.state, search.jobs)
    const margin = Math.min(trial.margin, leastMargin(laid, search.deadlines)?.margin ?? Infinity)
    if (margin > best.margin + SAME_MARGIN) best = { order: orderOf(trial), margin }
  }
  return best
}

function orderOf(trial: Trial): readonly number[] {
  const order: number[] = []
  for (let at: Trial | null = trial; at; at = at.before) order.unshift(at.job)
  return order
}

function begun(search: Search, state: LayingState, job: number): Trial {
  const bare = { low: job, high: job, margin: Infinity, before: null }
  return handedOut(search, { ...bare, state }, job)
}

function nextTrials(search: Search, trial: Trial): readonly Trial[] {
  const { low, high, state, margin } = trial
  const next: Trial[] = []
  const bare = { state, margin, before: trial }
  if (low > 0) next.push(handedOut(search, { ...bare, low: low - 1, high }, low - 1))
  if (high < search.jobs.length - 1) {
    next.push(handedOut(search, { ...bare, low, high: high + 1 }, high + 1))
  }
  return next
}

function handedOut(search: Search, trial: Omit<Trial, 'job' | 'bound'>, job: number): Trial {
  const state = handOut(trial.state, job, search.jobs)
  const least = leastMargin(state.laid, search.deadlines)?.margin ?? Infinity
  const margin = Math.min(trial.margin, least)
  const next = { ...trial, state, margin, job }
  return { ...next, bound: Math.min(margin, coming(search, next)) }
}

/**
 * No order can leave more than this: what is open goes on without waiting, and what is left is done in
 * order of deadline by all pairs together as if it could be shared at will.
 */
function coming(search: Search, { low, high, state }: Omit<Trial, 'job' | 'bound'>): number {
  const { jobs, deadlines, byDeadline } = search
  let bound = Infinity
  let ready = state.pairs.reduce((sum, free) => (free < Infinity ? sum + free : sum), 0)
  for (const { job, wants } of state.open) {
    const end = wants + jobs[job]!.fill + jobs[job]!.after
    ready += end
    bound = Math.min(bound, deadlines[job]! - end)
  }
  for (const job of byDeadline) {
    if (job >= low && job <= high) continue
    const { before, fill, after } = jobs[job]!
    ready += before + fill + after
    bound = Math.min(bound, deadlines[job]! - ready / state.pairs.length)
  }
  return bound
}

function placesByDeadline(deadlines: readonly number[]): readonly number[] {
  return deadlines.map((_, i) => i).sort((a, b) => deadlines[a]! - deadlines[b]! || a - b)
}

/** Of trials that have come to the same, the one with the largest margin. */
function distinct(trials: readonly Trial[]): Trial[] {
  const kept = new Map<string, Trial>()
  for (const trial of trials) {
    const key = keyOf(trial)
    const other = kept.get(key)
    if (!other || trial.margin > other.margin) kept.set(key, trial)
  }
  return [...kept.values()]
}

/** What the rest depends on; which of the pairs is free does not matter. */
function keyOf({ low, high, state: { pairs, blowers, open } }: Trial): string {
  const free = [...pairs].sort((a, b) => a - b).join()
  const filling = open.map(({ job, wants }) => `${job}@${wants}`).join()
  return `${low}-${high}|${free}|${[...blowers].sort((a, b) => a - b).join()}|${filling}`
}
