import { pressureAtTemperature } from '../calc/air/pressure-at-temperature'
import { GRAVITY, WATER_DENSITY } from '../constants'
import { SECTION_RANGES } from '../schemas/section-ranges'
import type { SectionCase } from '../schemas/section-case'

/** The figures of a scene that can be moved, SI units; temperatures in °C. */
export interface DemoValues {
  /** Depth of water on the wet side, and on the dry side [m]. */
  readonly depth: number
  readonly dryDepth: number
  /** How much of the skirt lies unrolled [m]. */
  readonly skirtLength: number
  /** Air pressure as it was filled [Pa], at which temperature, and the temperature now [°C]. */
  readonly airPressure: number
  readonly filledAt: number
  readonly temperature: number
  /** Share of the water pressure at the skirt's wet edge, 0 sealed to 1 open [–]. */
  readonly edgeFactor: number
  /** Peak gust on the empty tube [m/s]. */
  readonly gust: number
  /** Height of a crease under the skirt [m]; 0: none. */
  readonly crease: number
  /** Rate of rise [m/s] and time to clear the area [s]. */
  readonly rateOfRise: number
  readonly clearingTime: number
}
export type DemoValue = keyof DemoValues

/** A ground as a scene stands on it; a trainer may bring one with a name of its own. */
export interface DemoGround {
  readonly id: string
  /** A name that is not one of the catalogue's. */
  readonly name?: string
  readonly friction: number
  readonly permeability: number | null
  readonly layerThickness: number | null
  readonly isSuitable: boolean
}

/** Everything that a scene shows at one moment. */
export interface DemoSetting {
  readonly tube: SectionCase['barrier']
  readonly ground: DemoGround
  readonly values: DemoValues
  /** A stone under the skirt: shown, never computed from. */
  readonly hasStone: boolean
}

/** Air pressure now [Pa]: shut in at the temperature of filling. A limp tube keeps the least of the range. */
export function airPressureNow({ airPressure, filledAt, temperature }: DemoValues): number {
  const pressure = pressureAtTemperature({ airPressure, filledAt, now: temperature })
  return Math.max(SECTION_RANGES['barrier.airPressure'].min, pressure)
}

/** The case that the engine checks for a scene: global factor 1.5, water as in the workbench. */
export function sectionOf({ tube, ground, values }: DemoSetting): SectionCase {
  return {
    barrier: { ...tube, skirtLength: values.skirtLength, airPressure: airPressureNow(values) },
    ground: {
      friction: ground.friction,
      fall: 0,
      suitable: ground.isSuitable,
      permeability: ground.permeability,
      layerThickness: ground.layerThickness,
    },
    uplift: { model: 'linear', edgeFactor: values.edgeFactor, diffusivity: null, time: null },
    water: {
      depth: values.depth,
      dryDepth: values.dryDepth,
      density: WATER_DENSITY,
      currentSpeed: 0,
      dragCoefficient: SECTION_RANGES['water.dragCoefficient'].default,
      waveHeight: 0,
      wavePeriod: null,
    },
    debris: { force: 0, draught: SECTION_RANGES['debris.draught'].default },
    gravity: GRAVITY,
    requiredFreeboard: SECTION_RANGES.requiredFreeboard.default,
    basis: 'global-1.5',
  }
}

/** The same setting with other figures. */
export function withValues(setting: DemoSetting, values: Partial<DemoValues>): DemoSetting {
  return { ...setting, values: { ...setting.values, ...values } }
}
