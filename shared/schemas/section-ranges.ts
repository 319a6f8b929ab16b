import { GRAVITY, WATER_DENSITY } from '../constants'
import type { AllowedRange } from '../errors'

/** A bound that follows another field of the same case, such as 1.5 diameters. */
export interface RelativeBound {
  readonly times: number
  readonly of: NumericPath
}

/** The number that a field of a case may hold. */
export interface FieldRange {
  readonly min: number
  readonly max: number | RelativeBound
  readonly minExcluded?: boolean
  readonly unit: string
  /** Used where the field is left out; null: the quantity is then absent. No `default`: required. */
  readonly default?: number | null
  /** What the field means, for OpenAPI and `--schema`. */
  readonly meaning: string
}

/**
 * Ranges and defaults of one cross-section case. The form, the address, the API, the batch command,
 * OpenAPI and every message read this one table.
 */
export const SECTION_RANGES = {
  'barrier.diameter': { min: 0.2, max: 3, unit: 'm', meaning: 'Diameter of the unloaded tube' },
  'barrier.skirtLength': {
    min: 0,
    max: 15,
    unit: 'm',
    meaning: 'Skirt from the weld line to its wet edge',
  },
  'barrier.contactWidth': {
    min: 0,
    max: { times: 0.5, of: 'barrier.diameter' },
    unit: 'm',
    default: 0,
    meaning: 'Nominal contact strip of the tube on the ground',
  },
  'barrier.mass': {
    min: 0,
    max: 500,
    unit: 'kg/m',
    meaning: 'Mass of tube and skirt per metre run',
  },
  'barrier.airPressure': {
    min: 1,
    max: 100_000,
    unit: 'Pa',
    meaning: 'Air pressure above atmosphere',
  },
  'barrier.sectionLength': {
    min: 1,
    max: 100,
    unit: 'm',
    default: 10,
    meaning: 'Length of one section',
  },
  'barrier.fabricStrength': {
    min: 0,
    max: Infinity,
    minExcluded: true,
    unit: 'N/m',
    default: null,
    meaning: 'Tensile strength of the fabric; left out: the fabric is not checked',
  },
  'ground.friction': {
    min: 0,
    max: 1.5,
    minExcluded: true,
    unit: '–',
    meaning: 'Friction coefficient between skirt and ground',
  },
  'ground.fall': {
    min: -0.1,
    max: 0.1,
    unit: '–',
    default: 0,
    meaning: 'Crossfall tan β, positive where the ground falls to the dry side',
  },
  'ground.permeability': {
    min: 0,
    max: 1,
    unit: 'm/s',
    default: null,
    meaning: 'Permeability of the ground; left out: seepage is not computed',
  },
  'ground.layerThickness': {
    min: 0,
    max: Infinity,
    minExcluded: true,
    unit: 'm',
    default: null,
    meaning: 'Thickness of the pervious layer; needed for seepage',
  },
  'ground.undrainedStrength': {
    min: 0,
    max: 1_000_000,
    minExcluded: true,
    unit: 'Pa',
    default: null,
    meaning: 'Undrained strength of soft ground; left out: sliding is friction alone',
  },
  'uplift.edgeFactor': {
    min: 0,
    max: 1,
    unit: '–',
    default: 1,
    meaning: 'Share of the full head that reaches the skirt edge: 0 sealed, 1 open',
  },
  'uplift.weighedEdgeFactor': {
    min: 0,
    max: 1,
    unit: '–',
    default: 0.5,
    meaning:
      'Edge factor that a weighed edge counts with, where it is shown what weighing would change. Judgement, unverified',
  },
  'uplift.diffusivity': {
    min: 0,
    max: Infinity,
    minExcluded: true,
    unit: 'm²/s',
    default: null,
    meaning: 'Diffusivity of pressure under the skirt; required for the developing model',
  },
  'uplift.time': {
    min: 0,
    max: Infinity,
    unit: 's',
    default: null,
    meaning: 'Time since the water came; required for the developing model',
  },
  'water.depth': {
    min: 0,
    max: { times: 1.5, of: 'barrier.diameter' },
    unit: 'm',
    meaning: 'Depth of water on the wet side',
  },
  'water.dryDepth': {
    min: 0,
    max: { times: 1.5, of: 'barrier.diameter' },
    unit: 'm',
    default: 0,
    meaning: 'Depth of water standing on the dry side',
  },
  'water.density': {
    min: 900,
    max: 1200,
    unit: 'kg/m³',
    default: WATER_DENSITY,
    meaning: 'Density of the water',
  },
  'water.currentSpeed': {
    min: 0,
    max: 3.048,
    unit: 'm/s',
    default: 0,
    meaning: 'Current normal to the line; the bound is 10 ft/s (ASCE 7, 5.4.3)',
  },
  'water.dragCoefficient': {
    min: 1,
    max: 2.5,
    unit: '–',
    default: 2,
    meaning: 'Drag coefficient of the current',
  },
  'water.waveHeight': { min: 0, max: 3, unit: 'm', default: 0, meaning: 'Significant wave height' },
  'water.wavePeriod': {
    min: 0.5,
    max: 20,
    unit: 's',
    default: null,
    meaning: 'Wave period; required with waves',
  },
  'debris.force': {
    min: 0,
    max: Infinity,
    unit: 'N',
    default: 0,
    meaning: 'Force of floating debris on one section',
  },
  'debris.draught': {
    min: 0,
    max: Infinity,
    unit: 'm',
    default: 0.25,
    meaning: 'Depth from which floating debris can reach the barrier',
  },
  gravity: {
    min: 9.7,
    max: 9.9,
    unit: 'm/s²',
    default: GRAVITY,
    meaning: 'Acceleration of gravity',
  },
  requiredFreeboard: {
    min: 0,
    max: 2,
    unit: 'm',
    default: 0.1,
    meaning: 'Freeboard that the case asks for',
  },
} as const satisfies Record<
  string,
  Omit<FieldRange, 'max'> & { max: number | { times: number; of: string } }
>

/** Path of a numeric field of a cross-section case. */
export type NumericPath = keyof typeof SECTION_RANGES

export const NUMERIC_PATHS = Object.keys(SECTION_RANGES) as readonly NumericPath[]

/** The range of one field. */
export function fieldRange(path: NumericPath): FieldRange {
  return SECTION_RANGES[path] as FieldRange
}

/** The range with its bound worked out from the case that `read` looks into; a bound that cannot be read stays open. */
export function resolveRange(
  path: NumericPath,
  read: (path: NumericPath) => unknown,
): AllowedRange {
  const { min, max, minExcluded, unit } = fieldRange(path)
  const common = { min, unit, ...(minExcluded ? { minExcluded } : {}) }
  if (typeof max === 'number') return { ...common, max }
  const other = read(max.of)
  // 1.5 × 0.7 is 1.0499999999999998 in binary; the bound that a person reads, 1.05, is allowed too.
  const exact = typeof other === 'number' ? max.times * other : 0
  const bound = Math.max(exact, Number(exact.toPrecision(12)))
  return { ...common, max: bound > 0 ? bound : Infinity }
}
