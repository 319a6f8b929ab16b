import { checkBasis } from '@shared/catalogue/check-bases'
import { pressureAtTemperature } from '@shared/calc/air/pressure-at-temperature'
import { minimumAirPressure, type MinimumAirPressure } from '@shared/calc/air/minimum-air-pressure'
import { windOnEmptyBarrier, type WindDemand } from '@shared/calc/wind/wind-on-empty-barrier'
import { evaluateSection, type SectionEvaluation } from '@shared/checks/evaluate-section'
import { waterAllowance } from '@shared/checks/freeboard-check'
import { fieldRange } from '@shared/schemas/section-ranges'
import type { SectionCase } from '@shared/schemas/section-case'

/** Required factor against wind where the basis has partial factors. */
const WIND_FACTOR_OF_PARTIAL_BASIS = 1.5

/** Wind on the tube before the water holds it, with the sliding factor of the basis. */
export function windBefore(section: SectionCase, gust: number): WindDemand {
  const { barrier, ground, gravity, basis } = section
  const { format, sliding } = checkBasis(basis)
  return windOnEmptyBarrier({
    diameter: barrier.diameter,
    mass: barrier.mass,
    friction: ground.friction,
    gravity,
    gust,
    required: format === 'partial' ? WIND_FACTOR_OF_PARTIAL_BASIS : sliding,
  })
}

/** The section at another air temperature. */
export interface AtTemperature {
  readonly airPressure: number
  /** Null where no pressure is left. */
  readonly evaluation: SectionEvaluation | null
}

/** The section after its shut-in air went from one temperature to another [°C]. */
export function atTemperature(section: SectionCase, filledAt: number, now: number): AtTemperature {
  const airPressure = pressureAtTemperature({
    airPressure: section.barrier.airPressure,
    filledAt,
    now,
  })
  if (airPressure < fieldRange('barrier.airPressure').min) return { airPressure, evaluation: null }
  const barrier = { ...section.barrier, airPressure }
  return { airPressure, evaluation: evaluateSection({ ...section, barrier }) }
}

/** Least air pressure at this water, with the freeboard and allowances of the case. */
export function leastAirPressure(section: SectionCase): MinimumAirPressure | null {
  const { barrier, water, gravity, ground, requiredFreeboard } = section
  if (barrier.skirtLength === 0 || water.depth === 0) return null
  const sinFall = Math.sin(Math.atan(ground.fall))
  const wettedSkirt =
    sinFall > 0 ? Math.min(barrier.skirtLength, water.depth / sinFall) : barrier.skirtLength
  return minimumAirPressure({
    diameter: barrier.diameter,
    wettedSkirt,
    depth: water.depth,
    unitWeight: water.density * gravity,
    freeboard: requiredFreeboard + waterAllowance({ section }),
  })
}
