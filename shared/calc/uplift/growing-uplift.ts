import { OutOfRangeError, rangeFault, type Fault } from '../../errors'
import { cumulative, headOf, wholeBase, type ModeState } from './mode-sums'
import type { HeadUnderBase } from './under-base'
import { excessUpTo, LookTable, ventsOf } from './vents'

/** The base and how fast pressure spreads under it. */
export interface DiffusingBase {
  /** B [m], above 0. */
  readonly base: number
  /** Diffusivity, c [m²/s], above 0. */
  readonly diffusivity: number
}

/** Heads at both ends of the base [m], 0 or more. */
export interface EndHeads {
  /** η h_e at the wet edge. */
  readonly edge: number
  /** h_d at the dry toe. */
  readonly toe: number
}

/** How the growth begins. */
export interface GrowthStart extends EndHeads {
  /**
   * `dry`: the edge head comes at this moment, the head of the toe stands under the whole base, as in
   * the model of a step. `soaked`: it has stood long enough to fall evenly.
   */
  readonly ground: 'dry' | 'soaked'
  /** Shortest step that will be asked for [s]; it decides how many modes are kept. */
  readonly shortestStep: number
}

/** Modes that are kept at least and at most. Beyond, a mode counts as settled at once. */
const FEWEST_MODES = 64
const MOST_MODES = 256

/** 2/(nπ) and 2/(nπ)³ of the modes: how far a jump and a change of slope move them. */
const NUMBERS = Array.from({ length: MOST_MODES }, (_, i) => (i + 1) * Math.PI)
const OF_JUMP = Float64Array.from(NUMBERS, (n) => 2 / n)
const OF_SLOPE = Float64Array.from(NUMBERS, (n) => 2 / n ** 3)

/** A mode that has fallen by e⁻³⁰ within one step needs no memory. */
const SETTLED = 30

/** A mode that moves no further than this has settled [m]. */
const STILL = 1e-13

/** Durations are told apart to the microsecond [s]. */
const TICK = 1e-6

/** Decay factors are kept for so many lengths of step. */
const MOST_KEPT_STEPS = 8

/**
 * Water under the skirt while the level changes, carried forward step by step: each eigenmode of the
 * diffusion equation has one number that falls by e^(−n²π²cΔt/B²) in a step, so a step costs the
 * same however long the history is. Between two steps the heads at both ends change in a straight line.
 *
 * Same answer as Duhamel's integral (`upliftAtTime`), which has no water on the dry side; here the
 * water of the dry side creeps in from the toe. In falling water the pressure is capped point by
 * point: a limp skirt lifts and vents.
 *
 * @remarks 64 to 256 modes are kept; higher ones count as settled. So the force in the very moment of a
 * jump is true to 0.3 % of it (64) or 0.1 % (256), on the safe side where the water rises, and exact as
 * soon as τ = 10⁻³ (10⁻⁵) has passed.
 * @throws OutOfRangeError for a base, diffusivity or step that is not above 0, or a head below 0.
 * @see Carslaw & Jaeger, Conduction of Heat in Solids, 3.4, for the modes; recursive form derived here.
 */
export class GrowingUplift {
  private readonly unit: number
  private readonly modes: Float64Array
  private moving: number
  private heads: EndHeads
  private slopes: EndHeads = { edge: 0, toe: 0 }
  /** Highest head that either end has seen: no point under the base can be above it. */
  private highest: number
  private readonly decays: Map<number, Float64Array>
  private readonly looks: LookTable

  constructor(
    private readonly ground: DiffusingBase,
    start: GrowthStart | GrowingUplift,
  ) {
    if (start instanceof GrowingUplift) {
      this.unit = start.unit
      this.modes = start.modes.slice()
      this.moving = start.moving
      this.heads = start.heads
      this.slopes = start.slopes
      this.highest = start.highest
      this.decays = start.decays
      this.looks = start.looks
      return
    }
    assertStart(ground, start)
    this.unit = ground.base ** 2 / ground.diffusivity
    this.modes = new Float64Array(modesFor(start.shortestStep / this.unit))
    this.moving = 0
    this.heads = { edge: start.toe, toe: start.toe }
    this.highest = start.toe
    this.decays = new Map()
    this.looks = new LookTable(this.modes.length)
    if (start.ground === 'dry') this.jump(start)
    else this.settle(start)
  }

  /** A copy that can be carried forward on its own, to look into the middle of a step. */
  copy(): GrowingUplift {
    return new GrowingUplift(this.ground, this)
  }

  /** Goes back to where another growth of the same base stands, without making a new one. */
  take(other: GrowingUplift): void {
    this.modes.set(other.modes)
    this.moving = other.moving
    this.heads = other.heads
    this.slopes = other.slopes
    this.highest = other.highest
  }

  /** Carries the heads in a straight line to `to` within `duration` [s], above 0. */
  advance(duration: number, to: EndHeads): void {
    assertStep(duration, to)
    const edge = (to.edge - this.heads.edge) / duration
    const toe = (to.toe - this.heads.toe) / duration
    this.turn({ edge, toe })
    const decay = this.decayOf(duration)
    for (let i = 0; i < this.moving; i += 1) this.modes[i]! *= decay[i]!
    while (this.moving > 0 && Math.abs(this.modes[this.moving - 1]!) < STILL) this.moving -= 1
    this.reach(to)
  }

  /** Changes the heads at once. */
  jump(to: EndHeads): void {
    const edge = to.edge - this.heads.edge
    const toe = to.toe - this.heads.toe
    for (let i = 0; i < this.modes.length; i += 1) {
      const both = i % 2 === 0 ? edge + toe : edge - toe
      this.modes[i]! -= OF_JUMP[i]! * both
    }
    this.moving = this.modes.length
    this.reach(to)
  }

  /**
   * Head under the base now, nowhere above `cap`.
   *
   * @param cap Depth of the water that stands on the skirt [m].
   */
  under(cap: number): HeadUnderBase {
    const { base } = this.ground
    const state = this.state()
    const whole = wholeBase(state)
    const vents = this.highest > cap ? ventsOf(state, cap, this.looks) : []
    const over = excessUpTo(state, cap, vents, 1)
    const area = whole.area - over.area
    return {
      force: base * area,
      moment: base ** 2 * (area - (whole.moment - over.moment)),
      isVented: vents.length > 0,
      upTo: (length) => {
        const xi = Math.min(1, length / base)
        return base * (cumulative(state, xi).area - excessUpTo(state, cap, vents, xi).area)
      },
    }
  }

  /** Head at the distance x from the wet edge, not capped [m]. */
  headAt(x: number): number {
    return headOf(this.state(), x / this.ground.base)
  }

  private state(): ModeState {
    return {
      ...this.heads,
      edgeDrift: this.unit * this.slopes.edge,
      toeDrift: this.unit * this.slopes.toe,
      modes: this.modes,
      moving: this.moving,
    }
  }

  /** A new slope: what the modes settle to changes, and they are that much further away from it. */
  private turn(slopes: EndHeads): void {
    const edge = this.unit * (slopes.edge - this.slopes.edge)
    const toe = this.unit * (slopes.toe - this.slopes.toe)
    this.slopes = slopes
    if (edge === 0 && toe === 0) return
    for (let i = 0; i < this.modes.length; i += 1) {
      const both = i % 2 === 0 ? edge + toe : edge - toe
      this.modes[i]! += OF_SLOPE[i]! * both
    }
    this.moving = this.modes.length
  }

  private settle(heads: EndHeads): void {
    this.modes.fill(0)
    this.moving = 0
    this.reach(heads)
  }

  private reach({ edge, toe }: EndHeads): void {
    this.heads = { edge, toe }
    this.highest = Math.max(this.highest, edge, toe)
  }

  private decayOf(duration: number): Float64Array {
    const ticks = Math.round(duration / TICK)
    const kept = this.decays.get(ticks)
    if (kept) return kept
    const tau = (Math.PI ** 2 * duration) / this.unit
    const decay = this.modes.map((_, i) => Math.exp(-((i + 1) ** 2) * tau))
    if (this.decays.size < MOST_KEPT_STEPS) this.decays.set(ticks, decay)
    return decay
  }
}

/** Modes that still move within the shortest step, τ = c Δt/B². */
function modesFor(tau: number): number {
  const needed = Math.ceil(Math.sqrt(SETTLED / tau) / Math.PI)
  return Math.max(FEWEST_MODES, Math.min(MOST_MODES, needed))
}

/** The upper bound is not physical: it catches pascals given as metres. */
const HEAD = { min: 0, max: 1000, unit: 'm' }

function isHead(value: number): boolean {
  return value >= HEAD.min && value <= HEAD.max
}

function headFaults({ edge, toe }: EndHeads): Fault[] {
  return [
    ...(isHead(edge) ? [] : [rangeFault('uplift.edgeHead', edge, HEAD)]),
    ...(isHead(toe) ? [] : [rangeFault('uplift.toeHead', toe, HEAD)]),
  ]
}

function notPositive(path: string, value: number, unit: string): Fault[] {
  if (value > 0 && Number.isFinite(value)) return []
  return [rangeFault(path, value, { min: 0, minExcluded: true, max: Infinity, unit })]
}

function refuse(faults: readonly Fault[]): void {
  if (faults.length > 0) throw new OutOfRangeError(faults)
}

function assertStart({ base, diffusivity }: DiffusingBase, start: GrowthStart): void {
  refuse([
    ...notPositive('uplift.base', base, 'm'),
    ...notPositive('uplift.diffusivity', diffusivity, 'm²/s'),
    ...notPositive('uplift.shortestStep', start.shortestStep, 's'),
    ...headFaults(start),
  ])
}

function assertStep(duration: number, to: EndHeads): void {
  const isSound = duration > 0 && duration < Infinity && isHead(to.edge) && isHead(to.toe)
  if (isSound) return
  refuse([...notPositive('uplift.duration', duration, 's'), ...headFaults(to)])
}
