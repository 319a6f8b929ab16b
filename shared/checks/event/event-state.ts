import { AirRun } from '../../calc/air/air-through-time'
import { sectionGeometry, type SectionGeometry } from '../../calc/section/section-geometry'
import { valueWithin, type Stretch } from '../../calc/series/time-series'
import { grownPressure } from '../../calc/uplift/base-pressure'
import { GrowingUplift, type EndHeads } from '../../calc/uplift/growing-uplift'
import type { SectionCase } from '../../schemas/section-case'
import { fieldRange } from '../../schemas/section-ranges'
import { evaluateState } from '../evaluate-section'
import { sectionState } from '../section-state'
import type { EventInput } from './event-input'
import type { EventMoment } from './event-trace'
import type { Conditions } from './kept-checks'

/** Depth above which a case is not computed, in diameters. */
const DEEPEST = 1.5

/** Water under the base with the edge depth h_e, and with the depth h; on level ground the same. */
interface Growth {
  readonly edge: GrowingUplift
  readonly skirt: GrowingUplift
}

/** What a state carries from step to step. */
interface Carried {
  readonly now: number
  readonly air: AirRun | null
  readonly grown: Growth | null
}

function copyOf({ edge, skirt }: Growth): Growth {
  const copy = edge.copy()
  return { edge: copy, skirt: skirt === edge ? copy : skirt.copy() }
}

/**
 * A section on its way through one gap-free stretch of an event: the moment it is at, the water that
 * has crept under it and the air that is left. It can be copied, to look into the middle of a step.
 */
export class EventState {
  private now: number
  private readonly grown: Growth | null
  private readonly air: AirRun | null
  /** The answer of the step before: it stands while nothing changes. */
  private last: EventMoment | null = null

  private constructor(
    private readonly input: EventInput,
    private readonly stretch: Stretch,
    carried: Carried,
  ) {
    this.now = carried.now
    this.air = carried.air
    this.grown = carried.grown
  }

  /**
   * At the beginning of a stretch.
   *
   * @param before Highest depth that was known before the gap [m]; 0 at the very beginning.
   * @param air Air as it was before the gap; null at the very beginning.
   */
  static at(
    input: EventInput,
    stretch: Stretch,
    { before, air }: { readonly before: number; readonly air: AirRun | null },
  ): EventState {
    const now = stretch[0]!.time
    const { airPressure } = input.section.barrier
    const begun = air ?? (input.air ? new AirRun({ ...input.air, airPressure }) : null)
    const first = new EventState(input, stretch, { now, air: begun, grown: null })
    return new EventState(input, stretch, { now, air: begun, grown: first.beginGrowth(before) })
  }

  get time(): number {
    return this.now
  }

  /** Air as it is now, for the next stretch. */
  get airRun(): AirRun | null {
    return this.air
  }

  /** Depth on the wet side now [m]. */
  get depth(): number {
    return this.conditions().depth
  }

  /** A copy that can be carried forward on its own. */
  copy(): EventState {
    return new EventState(this.input, this.stretch, {
      now: this.now,
      air: this.air?.copy() ?? null,
      grown: this.grown && copyOf(this.grown),
    })
  }

  /** Goes back to where another state of the same stretch stands; cheaper than a copy. */
  take(other: EventState): void {
    this.now = other.now
    this.last = other.last
    if (this.air && other.air) this.air.take(other.air)
    if (!this.grown || !other.grown) return
    this.grown.edge.take(other.grown.edge)
    if (this.grown.skirt !== this.grown.edge) this.grown.skirt.take(other.grown.skirt)
  }

  /** Carries water under the skirt and air on to a later moment. */
  advance(time: number): void {
    const duration = time - this.now
    this.air?.advance(this.now, time)
    this.now = time
    if (!this.grown) return
    const heads = this.heads()
    this.grown.edge.advance(duration, heads.edge)
    if (this.grown.skirt !== this.grown.edge) this.grown.skirt.advance(duration, heads.skirt)
  }

  /** All checks at this moment. */
  moment(): EventMoment {
    const conditions = this.conditions()
    this.last =
      this.last && !this.grown && isSame(this.last, conditions)
        ? { ...this.last, time: this.now }
        : this.keptOr(conditions)
    return this.last
  }

  /** The same without what is kept to a tenth of a millimetre. */
  exactMoment(): EventMoment {
    return this.checked(this.conditions())
  }

  /** Growing water under the skirt has a history: there nothing is shared. */
  private keptOr(conditions: Conditions): EventMoment {
    const { kept } = this.input
    if (!kept || (this.grown && conditions.depth + conditions.dryDepth > 0)) {
      return this.checked(conditions)
    }
    return momentNow(kept.at(conditions, this.check), conditions, this.now)
  }

  private readonly check = (at: Conditions): EventMoment => this.checked(at)

  private checked(conditions: Conditions): EventMoment {
    const { section, gripShare } = this.input
    const { diameter } = section.barrier
    const deepest = DEEPEST * diameter * (1 + 1e-12)
    if (conditions.depth > deepest || conditions.dryDepth > deepest) {
      return drowned(this.now, conditions, conditions.depth > deepest)
    }
    const at = sectionAt(section, conditions)
    const state = sectionState(at, this.pressureFinder())
    const { vertical, verdict, governs, ...checks } = evaluateState(state, gripShare)
    return {
      time: this.now,
      ...conditions,
      uplift: vertical.uplift,
      verdict,
      governs,
      utilisation: checks[governs]!.utilisation,
      sliding: checks.sliding.factor,
      skirt: checks.skirt.factor,
      freeboard: checks.freeboard.available,
    }
  }

  private pressureFinder() {
    const { grown } = this
    if (!grown) return undefined
    return ({ unitWeight, depth, edgeDepth }: SectionGeometry) => {
      // On a crossfall towards the water the edge lies deepest; the skirt vents above what is there.
      const under = grown.edge.under(Math.max(depth, edgeDepth))
      const underSkirt = grown.skirt === grown.edge ? under : grown.skirt.under(depth)
      return grownPressure(under, underSkirt, unitWeight)
    }
  }

  private conditions(): Conditions {
    const { section, groundLevel, pond } = this.input
    const level = valueWithin(this.stretch, this.now)
    const pondLevel = pond ? valueWithin(pond, this.now) : groundLevel
    const pressure = this.air?.pressureAt(this.now) ?? section.barrier.airPressure
    return {
      depth: Math.max(0, level - groundLevel),
      dryDepth: Math.max(0, pondLevel - groundLevel),
      airPressure: pressure,
    }
  }

  private heads(): { readonly edge: EndHeads; readonly skirt: EndHeads } {
    const { section } = this.input
    const { depth, dryDepth } = this.conditions()
    const { edgeFactor } = section.uplift
    const { edgeDepth } = sectionGeometry({ ...section, water: { ...section.water, depth } })
    return {
      edge: { edge: edgeFactor * edgeDepth, toe: dryDepth },
      skirt: { edge: edgeFactor * depth, toe: dryDepth },
    }
  }

  /** After a gap, and where the series begins in water, the ground counts as soaked. */
  private beginGrowth(before: number): Growth | null {
    const { section, step, groundBefore = 'soaked' } = this.input
    const { model, diffusivity, edgeFactor } = section.uplift
    const base = section.barrier.skirtLength + section.barrier.contactWidth
    if (model !== 'developing' || diffusivity === null || base === 0) return null
    const heads = this.heads()
    const begin = (now: EndHeads): GrowingUplift => {
      const soakedBy = Math.max(now.edge, edgeFactor * before)
      const ground = before > 0 ? 'soaked' : groundBefore
      const start = { edge: soakedBy, toe: now.toe, ground, shortestStep: step } as const
      const growing = new GrowingUplift({ base, diffusivity }, start)
      if (soakedBy !== now.edge) growing.jump(now)
      return growing
    }
    const edge = begin(heads.edge)
    const isLevel = section.ground.fall === 0
    return { edge, skirt: isLevel ? edge : begin(heads.skirt) }
  }
}

/** What is kept, at this very moment; written out, because spreading would cost more than the rest. */
function momentNow(kept: EventMoment, conditions: Conditions, time: number): EventMoment {
  return {
    time,
    depth: conditions.depth,
    dryDepth: conditions.dryDepth,
    airPressure: conditions.airPressure,
    uplift: kept.uplift,
    verdict: kept.verdict,
    governs: kept.governs,
    utilisation: kept.utilisation,
    sliding: kept.sliding,
    skirt: kept.skirt,
    freeboard: kept.freeboard,
  }
}

function isSame(a: Conditions, b: Conditions): boolean {
  return a.depth === b.depth && a.dryDepth === b.dryDepth && a.airPressure === b.airPressure
}

/** The section as a case of its own at these depths and this pressure. */
function sectionAt(section: SectionCase, conditions: Conditions): SectionCase {
  const { depth, dryDepth } = conditions
  // A limp tube is computed at the least pressure that a case may have: it gives way at once.
  const airPressure = Math.max(conditions.airPressure, fieldRange('barrier.airPressure').min)
  return {
    ...section,
    barrier: { ...section.barrier, airPressure },
    water: { ...section.water, depth, dryDepth },
  }
}

/** Deeper than the method goes: nothing holds there. */
function drowned(time: number, conditions: Conditions, isWet: boolean): EventMoment {
  return {
    time,
    ...conditions,
    uplift: 0,
    verdict: 'fails',
    governs: isWet ? 'freeboard' : 'sliding',
    utilisation: null,
    sliding: null,
    skirt: null,
    freeboard: null,
  }
}
