import { findRoot, type Bracket } from '../numerics/find-root'
import { hoseLoss, type HoseFlow } from './hose'
import { fitPumpCurve, pumpHead, type CurvePoint } from './pump-curve'

/** One or more equal pumps on one hose. */
export interface PumpSystem extends HoseFlow {
  /** Outlet above the water in the sump [m]. */
  readonly staticHead: number
  readonly pumpCurve: readonly CurvePoint[]
  /** Equal pumps side by side on the one hose. */
  readonly pumps: number
}

/**
 * - `duty`: the curves cross.
 * - `runs-out`: at the last point the pump still stands above the system.
 * - `does-not-pump`: the lift is higher than the pump can press.
 */
export type DutyState = 'duty' | 'runs-out' | 'does-not-pump'

export interface PumpDuty {
  readonly state: DutyState
  /** Flow of all pumps together [m³/s]. */
  readonly flow: number
  /** Head of the system at that flow [m]. */
  readonly head: number
  /** Pump head less system head at the last point [m]; only where the pump runs out of its curve. */
  readonly headLeft?: number
}

/**
 * Duty point of pumps on a hose: where the pump curve crosses static head + losses. n pumps side by
 * side give n times the flow at the same head.
 *
 * @see White, Fluid Mechanics, ch. 11, matching pumps to systems.
 */
export function pumpDuty(system: PumpSystem): PumpDuty {
  const { staticHead, pumps } = system
  const curve = fitPumpCurve(system.pumpCurve)
  const systemHead = (flow: number): number => staticHead + hoseLoss(system, flow)
  const spare = (flow: number): number => pumpHead(curve, flow / pumps) - systemHead(flow)

  const shutOff = spare(0)
  if (shutOff <= 0) return { state: 'does-not-pump', flow: 0, head: staticHead }
  const last = pumps * curve.lastFlow
  const crossing = firstCrossing(spare, shutOff, last)
  if (crossing === null) {
    return { state: 'runs-out', flow: last, head: systemHead(last), headLeft: spare(last) }
  }
  const flow = findRoot(spare, crossing)
  return { state: 'duty', flow, head: systemHead(flow) }
}

/** Parts in which the way to the last point is looked at. */
const PARTS = 32

/**
 * The first part in which the pump falls below the system; null where it never does. A parabola that
 * is hollow may dip below the system and rise above it again: the pump stays at the first crossing.
 */
function firstCrossing(
  spare: (flow: number) => number,
  shutOff: number,
  last: number,
): Bracket | null {
  let [low, atLow] = [0, shutOff]
  for (let part = 1; part <= PARTS; part += 1) {
    const high = (part * last) / PARTS
    const atHigh = spare(high)
    if (atHigh <= 0) return { low, high, atLow, atHigh }
    low = high
    atLow = atHigh
  }
  return null
}
