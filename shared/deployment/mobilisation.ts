import type { Depot } from '../schemas/depot'
import type { DeploymentSettings } from '../schemas/deployment'

/** A pair or a blower, and how long after the decision it is at the line [s]. */
export interface Comer {
  readonly after: number
  /** Name of the depot; null where no depot has it. */
  readonly depot: string | null
  /** Kept by a depot; otherwise it is taken to come with the last one that is. */
  readonly isInStore: boolean
}

export interface Mobilisation {
  /** Depot that the first pair comes from; null where no depot has a crew. */
  readonly depot: string | null
  readonly callOutTime: number
  readonly loadTime: number
  readonly driveTime: number
  /** Every pair and blower of the depots, the first at the line first. */
  readonly pairs: readonly Comer[]
  readonly blowers: readonly Comer[]
}

type Times = Pick<Depot, 'callOutTime' | 'loadTime' | 'driveTime'>
type MobilisationSettings = Pick<DeploymentSettings, 'callOutTime' | 'loadTime' | 'driveTime'>
export type MobilisingDepot = Times & Pick<Depot, 'name' | 'crews' | 'items'>

/**
 * Who can be at the line and when: call-out, loading and driving of each depot, and the delay of a
 * crew. Times in the settings stand in place of those of the depot that the first pair comes from. A
 * crew of four is two pairs; who is alone is none.
 *
 * @see Environment Agency, Temporary and Demountable Flood Protection Guide (SC080019): T0 = T1 −
 * mobilisation.
 */
export function mobilisation(
  depots: readonly MobilisingDepot[],
  settings: MobilisationSettings,
): Mobilisation {
  const main = firstOf(depots)
  const own = (depot: Times): Times =>
    depot === main || !main ? withSettings(depot, settings) : depot
  const none: Times = { callOutTime: 0, loadTime: 0, driveTime: 0 }
  const { callOutTime, loadTime, driveTime } = withSettings(main ?? none, settings)
  const pairs = depots.flatMap((depot) => pairsOf(depot, total(own(depot))))
  const blowers = depots.flatMap((depot) => blowersOf(depot, total(own(depot))))
  return {
    ...{ depot: main?.name ?? null, callOutTime, loadTime, driveTime },
    pairs: [...pairs].sort(byTime),
    blowers: [...blowers].sort(byTime),
  }
}

/**
 * The first so many; what no depot has is taken to come with the last one that it has, and where it
 * has none, with the first pair.
 *
 * @param first Time of the first pair after the decision [s].
 */
export function comers(have: readonly Comer[], count: number, first: number): readonly Comer[] {
  const last = have.at(-1)?.after ?? first
  return Array.from(
    { length: count },
    (_, i) => have[i] ?? { after: last, depot: null, isInStore: false },
  )
}

/** Call-out, loading and driving together [s]. */
export function total({ callOutTime, loadTime, driveTime }: Times): number {
  return callOutTime + loadTime + driveTime
}

const byTime = (a: Comer, b: Comer): number => a.after - b.after

function withSettings(depot: Times, settings: MobilisationSettings): Times {
  return {
    callOutTime: settings.callOutTime ?? depot.callOutTime,
    loadTime: settings.loadTime ?? depot.loadTime,
    driveTime: settings.driveTime ?? depot.driveTime,
  }
}

/** The depot from which a pair is at the line first. */
function firstOf(depots: readonly MobilisingDepot[]): MobilisingDepot | null {
  const first = (depot: MobilisingDepot) =>
    Math.min(...pairsOf(depot, total(depot)).map(({ after }) => after))
  return depots
    .filter((depot) => pairsOf(depot, 0).length > 0)
    .reduce<MobilisingDepot | null>(
      (best, depot) => (best && first(best) <= first(depot) ? best : depot),
      null,
    )
}

function pairsOf({ name, crews }: MobilisingDepot, there: number): readonly Comer[] {
  return crews.flatMap(({ crews: count, people, delay }) =>
    Array.from({ length: count * Math.floor(people / 2) }, () => ({
      after: there + delay,
      depot: name,
      isInStore: true,
    })),
  )
}

function blowersOf({ name, items }: MobilisingDepot, there: number): readonly Comer[] {
  const count = items
    .filter(({ kind }) => kind === 'blower')
    .reduce((sum, { serviceable }) => sum + serviceable, 0)
  return Array.from({ length: count }, () => ({ after: there, depot: name, isInStore: true }))
}
