/** What a pump does and needs. */
export interface PumpWork {
  readonly flow: number
  readonly head: number
  /** Efficiency, η [–], above 0 to 1. */
  readonly efficiency: number
  readonly density: number
  readonly gravity: number
}

export interface PumpPower {
  /** ρ g Q H [W]. */
  readonly hydraulic: number
  /** Power at the shaft, ρ g Q H / η [W]. */
  readonly shaft: number
}

/** Power of a pump. */
export function pumpPower({ flow, head, efficiency, density, gravity }: PumpWork): PumpPower {
  const hydraulic = density * gravity * flow * head
  return { hydraulic, shaft: hydraulic / efficiency }
}

/**
 * Volume of a sump between start and stop level so that a pump of flow q does not start more often
 * than once in t: V = t q / 4   [m³]. The worst inflow is half of q.
 *
 * @see MIL-HDBK-1005/9A.
 */
export function sumpVolume(cycleTime: number, pumpFlow: number): number {
  return (cycleTime * pumpFlow) / 4
}

/** Time between two starts, V/Q_in + V/(q − Q_in) [s]; null where the pump never stops or starts. */
export function cycleTime(volume: number, pumpFlow: number, inflow: number): number | null {
  if (inflow <= 0 || inflow >= pumpFlow) return null
  return volume / inflow + volume / (pumpFlow - inflow)
}

/** A pump at another speed: flow, head and power change as n, n², n³. */
export function affinity(speedRatio: number): { flow: number; head: number; power: number } {
  return { flow: speedRatio, head: speedRatio ** 2, power: speedRatio ** 3 }
}

/** Energy that a pump takes in a time [J]. */
export function pumpEnergy(power: PumpPower, runningTime: number): number {
  return power.shaft * runningTime
}

/**
 * Fuel that an engine takes in a time.
 *
 * @param rate Fuel per second at this load [m³/s], as its maker prints it.
 * @returns Volume of fuel [m³].
 */
export function fuelNeeded(rate: number, runningTime: number): number {
  return rate * runningTime
}
