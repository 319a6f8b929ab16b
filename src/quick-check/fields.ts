import type { AllowedRange } from '@shared/errors'
import type { FieldDefinition } from './field-definition'
import { PART_INPUTS } from './part-inputs'

/** Dry land and its waters: from the Dead Sea to high mountain lakes. */
const level: AllowedRange = { min: -500, max: 6000, unit: 'm' }
const temperature: AllowedRange = { min: -40, max: 60, unit: '°C' }

/** Every number of the Quick check, in the order of the address. */
export const FIELDS = {
  depth: { kind: 'length', key: 'depth', initial: 0.42, path: 'water.depth', isAlwaysSent: true },
  level: { kind: 'length', key: 'level', initial: 3.29, range: level },
  stage: { kind: 'length', key: 'stage', initial: 2.69, range: level },
  gaugeZero: { kind: 'length', key: 'zero', initial: 0.6, range: level },
  gaugeCorrection: {
    kind: 'length',
    key: 'tosite',
    initial: 0,
    range: { min: -20, max: 20, unit: 'm' },
  },
  groundLevel: { kind: 'length', key: 'groundlevel', initial: 2.87, range: level },
  uncertainty: {
    kind: 'length',
    key: 'plusminus',
    initial: 0,
    range: { min: 0, max: 3, unit: 'm' },
  },
  waterNow: { kind: 'length', key: 'now', initial: null, range: level, isOptional: true },
  dryDepth: { kind: 'length', key: 'drydepth', initial: 0, path: 'water.dryDepth' },
  currentSpeed: { kind: 'speed', key: 'current', initial: 0, path: 'water.currentSpeed' },
  dragCoefficient: { kind: 'ratio', key: 'drag', initial: 2, path: 'water.dragCoefficient' },
  waveHeight: { kind: 'length', key: 'wave', initial: 0, path: 'water.waveHeight' },
  wavePeriod: {
    kind: 'seconds',
    key: 'period',
    initial: null,
    path: 'water.wavePeriod',
    isOptional: true,
  },
  debrisForce: { kind: 'force', key: 'debris', initial: 0, path: 'debris.force' },
  draught: { kind: 'length', key: 'draught', initial: 0.25, path: 'debris.draught' },
  density: { kind: 'density', key: 'density', initial: 1000, path: 'water.density' },
  gravity: { kind: 'ratio', key: 'gravity', initial: 9.81, path: 'gravity' },
  rateOfRise: {
    kind: 'rate',
    key: 'rise',
    initial: null,
    range: { min: 0, max: 10 / 3600, unit: 'm/s' },
    isOptional: true,
  },
  clearTime: {
    kind: 'minutes',
    key: 'clear',
    initial: 1200,
    range: { min: 0, max: 86_400, unit: 's' },
  },
  diameter: {
    kind: 'length',
    key: 'diameter',
    initial: 0.7,
    path: 'barrier.diameter',
    isAlwaysSent: true,
  },
  skirtLength: {
    kind: 'length',
    key: 'skirt',
    initial: 2.2,
    path: 'barrier.skirtLength',
    isAlwaysSent: true,
  },
  contactWidth: {
    kind: 'length',
    key: 'strip',
    initial: 0.12,
    path: 'barrier.contactWidth',
    isAlwaysSent: true,
  },
  mass: {
    kind: 'massPerLength',
    key: 'mass',
    initial: 4.8,
    path: 'barrier.mass',
    isAlwaysSent: true,
  },
  airPressure: {
    kind: 'pressure',
    key: 'air',
    initial: 15_000,
    path: 'barrier.airPressure',
    isAlwaysSent: true,
  },
  sectionLength: { kind: 'length', key: 'section', initial: 10, path: 'barrier.sectionLength' },
  fabricStrength: {
    kind: 'forcePerLength',
    key: 'fabric',
    initial: 60_000,
    path: 'barrier.fabricStrength',
    isOptional: true,
  },
  statedHeight: {
    kind: 'length',
    key: 'stated',
    initial: 0.7,
    range: { min: 0, max: 5, minExcluded: true, unit: 'm' },
    isOptional: true,
  },
  requiredFreeboard: {
    kind: 'length',
    key: 'freeboard',
    initial: 0.1,
    path: 'requiredFreeboard',
  },
  friction: {
    kind: 'ratio',
    key: 'friction',
    initial: 0.45,
    path: 'ground.friction',
    isAlwaysSent: true,
  },
  fall: { kind: 'percent', key: 'fall', initial: 0, path: 'ground.fall' },
  permeability: {
    kind: 'permeability',
    key: 'permeability',
    initial: 1e-5,
    path: 'ground.permeability',
    isOptional: true,
  },
  layerThickness: {
    kind: 'length',
    key: 'layer',
    initial: 2,
    path: 'ground.layerThickness',
    isOptional: true,
  },
  edgeFactor: {
    kind: 'percent',
    key: 'edge',
    initial: 1,
    path: 'uplift.edgeFactor',
    isAlwaysSent: true,
  },
  weighedEdge: {
    kind: 'percent',
    key: 'weighed',
    initial: 0.5,
    path: 'uplift.weighedEdgeFactor',
  },
  undrainedStrength: {
    kind: 'pressure',
    key: 'undrained',
    initial: null,
    path: 'ground.undrainedStrength',
    isOptional: true,
  },
  diffusivity: {
    kind: 'diffusivity',
    key: 'diffusivity',
    initial: null,
    path: 'uplift.diffusivity',
    isOptional: true,
  },
  upliftTime: {
    kind: 'hours',
    key: 'since',
    initial: null,
    path: 'uplift.time',
    isOptional: true,
  },
  edgeWeight: {
    kind: 'massPerLength',
    key: 'edgeweight',
    initial: 40,
    range: { min: 0, max: 500, unit: 'kg/m' },
    group: 'before',
  },
  ...PART_INPUTS,
  windGust: {
    kind: 'speed',
    key: 'gust',
    initial: 12,
    range: { min: 0, max: 60, unit: 'm/s' },
    group: 'before',
  },
  filledAt: {
    kind: 'temperature',
    key: 'filledat',
    initial: 12,
    range: temperature,
    group: 'before',
  },
  coldest: { kind: 'temperature', key: 'coldest', initial: 0, range: temperature, group: 'before' },
  hottest: {
    kind: 'temperature',
    key: 'hottest',
    initial: 30,
    range: temperature,
    group: 'before',
  },
} as const satisfies Record<string, FieldDefinition>

export type FieldId = keyof typeof FIELDS

export const FIELD_IDS = Object.keys(FIELDS) as readonly FieldId[]

/** The definition of one field, with its optional parts. */
export function fieldOf(id: FieldId): FieldDefinition {
  return FIELDS[id]
}
