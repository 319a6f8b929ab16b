import type { PondPump } from '../ponding/pond'
import { pumpDuty, type PumpSystem } from '../pumping/pump-duty'
import { pumpPower } from '../pumping/pump-power'

/** A pump of the dry side with its hose over the barrier. */
export interface DryPump {
  readonly name: string
  /** Pond levels at which it starts and stops [m]. */
  readonly startLevel: number
  readonly stopLevel: number
  /** Level over which the hose leads [m]. */
  readonly outletLevel: number
  readonly system: Omit<PumpSystem, 'staticHead'>
  /** Moment at which it breaks down for good [s]. */
  readonly failsAt?: number
  /** Efficiency of the whole set, above 0 to 1; left out: its energy is not asked for. */
  readonly efficiency?: number
  readonly density?: number
}

/** Levels between which the duty point is worked out beforehand, and how many there are. */
const POINTS = 129

/**
 * A pump as the pond sees it: what it delivers at each level. The duty point is worked out at 129
 * levels and taken straight between them, to about 1e-6 of the flow; outside them it is worked out
 * each time.
 */
export function pondPump(pump: DryPump, lowest: number, highest: number): PondPump {
  const { name, startLevel, stopLevel, outletLevel, system, efficiency, density = 1000 } = pump
  const dutyAt = (level: number) => pumpDuty({ ...system, staticHead: outletLevel - level })
  const spacing = (highest - lowest) / (POINTS - 1)
  const flows = Array.from({ length: POINTS }, (_, i) => dutyAt(lowest + i * spacing).flow)
  const flowAt = (level: number): number => {
    const place = (level - lowest) / spacing
    const i = Math.floor(place)
    if (!(i >= 0 && i < POINTS - 1)) return dutyAt(level).flow
    return flows[i]! + (place - i) * (flows[i + 1]! - flows[i]!)
  }
  return {
    name,
    startLevel,
    stopLevel,
    flowAt,
    ...(pump.failsAt === undefined ? {} : { failsAt: pump.failsAt }),
    ...(efficiency === undefined
      ? {}
      : {
          powerAt: (level) => {
            const { flow, head } = dutyAt(level)
            return pumpPower({ flow, head, efficiency, density, gravity: system.gravity }).shaft
          },
        }),
  }
}
