import type { PondingCase } from '../../schemas/ponding-case'
import { pondPump } from '../dry-side/pond-pumps'
import { valueWithin } from '../series/time-series'
import type { PondInput, PondPump } from './pond'
import { stageStorage } from './stage-storage'

/** Name of the one pump of a case that names none. */
const THE_PUMP = 'pump'

/** How far above the table the duty of a pump is worked out beforehand [m]. */
const HEADROOM = 2

/**
 * A pond from a case as it is sent.
 *
 * @remarks Expects a case without faults, see `pondingFaults`.
 */
export function pondInputOf(pond: PondingCase): PondInput {
  const { inflow, initialLevel, duration, step, thresholds } = pond
  const table = pond.areaTable?.map(([level, area]) => ({ level, area })) ?? [
    { level: Math.min(0, initialLevel), area: pond.area ?? 0 },
  ]
  const top = table[table.length - 1]!.level + HEADROOM
  const readings =
    typeof inflow === 'number'
      ? [{ time: 0, value: inflow }]
      : inflow.map(([time, value]) => ({ time, value }))
  return {
    storage: stageStorage(table),
    inflowAt: (time) => valueWithin(readings, time),
    pumps: [...onePump(pond), ...pond.pumps.map((pump) => pumpOf(pump, table[0]!.level, top))],
    initialLevel,
    duration,
    step,
    thresholds,
  }
}

function onePump({ pump, startLevel = 0, stopLevel = 0 }: PondingCase): readonly PondPump[] {
  return pump === 0 ? [] : [{ name: THE_PUMP, startLevel, stopLevel, flowAt: () => pump }]
}

function pumpOf(pump: PondingCase['pumps'][number], lowest: number, top: number): PondPump {
  const { name, startLevel, stopLevel, flow = 0, system, outletLevel = 0, failsAt } = pump
  const fails = failsAt === undefined ? {} : { failsAt }
  if (system) {
    return pondPump({ name, startLevel, stopLevel, outletLevel, system, ...fails }, lowest, top)
  }
  return { name, startLevel, stopLevel, flowAt: () => flow, ...fails }
}
