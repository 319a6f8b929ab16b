import { z } from 'zod'
import { GRAVITY } from '../constants'
import { isInRange, rangeFault, type AllowedRange, type Fault } from '../errors'

/** Kinematic viscosity of fresh water at 10 °C [m²/s]. */
const VISCOSITY_10 = 1.3063e-6

/** What each number of a flow case may be, by its path. */
export const FLOW_RANGES = {
  permeability: { min: 0, max: 1, unit: 'm/s' },
  head: { min: 0, max: 100, unit: 'm' },
  baseWidth: { min: 0.001, max: 10_000, unit: 'm' },
  layerThickness: { min: 0.001, max: 100_000, unit: 'm' },
  staticHead: { min: -50, max: 500, unit: 'm' },
  viscosity: { min: 1e-7, max: 1e-3, unit: 'm²/s' },
  gravity: { min: 9.7, max: 9.9, unit: 'm/s²' },
  'hose.diameter': { min: 0.01, max: 2, unit: 'm' },
  'hose.length': { min: 0, max: 10_000, unit: 'm' },
  'hose.roughness': { min: 0, max: 0.1, unit: 'm' },
  'hose.minorLoss': { min: 0, max: 1000, unit: '–' },
  pumps: { min: 1, max: 100, unit: 'pumps' },
} as const satisfies Record<string, AllowedRange>

type FlowPath = keyof typeof FLOW_RANGES

function number(path: FlowPath, description: string) {
  const { min, max, unit } = FLOW_RANGES[path]
  return z.number().meta({ description, unit, minimum: min, maximum: max })
}

function command(name: string) {
  return z.literal(name).optional().meta({ description: 'Must match the batch command' })
}

/** Seepage through pervious ground under a flat base. */
export const seepageCaseSchema = z
  .strictObject({
    command: command('seepage'),
    permeability: number('permeability', 'Permeability of the ground'),
    head: number('head', 'Difference of head between wet and dry side'),
    baseWidth: number('baseWidth', 'Width of the base, skirt and contact strip'),
    layerThickness: number('layerThickness', 'Thickness of the pervious layer'),
  })
  .meta({ id: 'SeepageCase', description: 'Seepage per metre of line, SI units' })
export type SeepageCase = Omit<z.output<typeof seepageCaseSchema>, 'command'>

export const seepageResultSchema = z
  .strictObject({ perMetre: z.number().meta({ unit: 'm²/s' }) })
  .meta({ id: 'SeepageResult' })

/** A hose or main from pump to outlet. */
export const hoseSchema = z.strictObject({
  diameter: number('hose.diameter', 'Inner diameter'),
  length: number('hose.length', 'Length'),
  roughness: number('hose.roughness', 'Roughness height, at most 0.05 diameters'),
  minorLoss: number('hose.minorLoss', 'Sum of the loss coefficients, exit loss included'),
})

/** Points of a pump curve: flow [m³/s] and head [m], by rising flow, the first without flow. */
export const pumpCurveSchema = z
  .array(z.tuple([z.number().meta({ unit: 'm³/s' }), z.number().meta({ unit: 'm' })]))
  .meta({ description: 'Flow and head of each point, by rising flow, the first at no flow' })

/** A pump, or several equal ones, on one hose. */
export const pumpSystemSchema = z.strictObject({
  viscosity: number('viscosity', 'Kinematic viscosity; left out: 10 °C').default(VISCOSITY_10),
  gravity: number('gravity', 'Acceleration of gravity').default(GRAVITY),
  hose: hoseSchema,
  pumpCurve: pumpCurveSchema,
  pumps: number('pumps', 'Equal pumps side by side on the one hose').int().default(1),
})

/** Duty point of pumps on a hose. */
export const dutyCaseSchema = pumpSystemSchema
  .extend({
    command: command('duty'),
    staticHead: number('staticHead', 'Outlet above the water in the sump'),
  })
  .meta({ id: 'DutyCase', description: 'Pumps on a hose, SI units' })
export type DutyCase = Omit<z.output<typeof dutyCaseSchema>, 'command'>

export const dutyResultSchema = z
  .strictObject({
    state: z.enum(['duty', 'runs-out', 'does-not-pump']),
    flow: z.number().meta({ unit: 'm³/s', description: 'All pumps together' }),
    head: z.number().meta({ unit: 'm', description: 'Of the system at that flow' }),
    headLeft: z
      .number()
      .optional()
      .meta({ unit: 'm', description: 'Pump head less system head; where the pump runs out' }),
  })
  .meta({ id: 'DutyResult' })

/** Everything in a seepage case that lies outside its range. */
export function seepageFaults(seepage: SeepageCase): readonly Fault[] {
  return [
    ...outside('permeability', seepage.permeability),
    ...outside('head', seepage.head),
    ...outside('baseWidth', seepage.baseWidth),
    ...outside('layerThickness', seepage.layerThickness),
  ]
}

/** Everything in a duty case that cannot be computed. */
export function dutyFaults(duty: DutyCase): readonly Fault[] {
  return [...outside('staticHead', duty.staticHead), ...pumpSystemFaults(duty)]
}

/** The same of pumps and hose alone. */
export function pumpSystemFaults(
  system: Omit<DutyCase, 'staticHead'>,
  prefix = '',
): readonly Fault[] {
  const { viscosity, gravity, hose, pumpCurve, pumps } = system
  const faults = [
    ...outside('viscosity', viscosity, prefix),
    ...outside('gravity', gravity, prefix),
    ...outside('hose.diameter', hose.diameter, prefix),
    ...outside('hose.length', hose.length, prefix),
    ...outside('hose.roughness', hose.roughness, prefix),
    ...outside('hose.minorLoss', hose.minorLoss, prefix),
    ...outside('pumps', pumps, prefix),
    ...curveFaults(pumpCurve, `${prefix}pumpCurve`),
  ]
  return faults.length > 0 ? faults : tooRough(hose, prefix)
}

function outside(path: FlowPath, value: number, prefix = ''): Fault[] {
  const range: AllowedRange = FLOW_RANGES[path]
  return isInRange(value, range) ? [] : [rangeFault(`${prefix}${path}`, value, range)]
}

/** Above 0.05 diameters Colebrook's formula says nothing. */
function tooRough({ diameter, roughness }: DutyCase['hose'], prefix: string): Fault[] {
  const range = { min: 0, max: 0.05 * diameter, unit: 'm' }
  return isInRange(roughness, range)
    ? []
    : [rangeFault(`${prefix}hose.roughness`, roughness, range)]
}

const POINTS: AllowedRange = { min: 2, max: 200, unit: 'points' }
const CURVE_HEAD: AllowedRange = { min: 0, max: 1000, unit: 'm' }
const MOST_FLOW = 100

/** A curve begins without flow, and every point has more flow than the one before it. */
function curveFaults(curve: DutyCase['pumpCurve'], path: string): Fault[] {
  if (!isInRange(curve.length, POINTS)) return [rangeFault(`${path}.length`, curve.length, POINTS)]
  return curve.flatMap(([flow, head], i) => {
    const least = i === 0 ? 0 : curve[i - 1]![0]
    const flows: AllowedRange =
      i === 0
        ? { min: 0, max: 0, unit: 'm³/s' }
        : { min: least, minExcluded: true, max: MOST_FLOW, unit: 'm³/s' }
    const atStart = i === 0 ? ' (the head at no flow decides whether the pump lifts at all)' : ''
    return [
      ...(isInRange(flow, flows)
        ? []
        : [because(rangeFault(`${path}[${i}][0]`, flow, flows), atStart)]),
      ...(isInRange(head, CURVE_HEAD) ? [] : [rangeFault(`${path}[${i}][1]`, head, CURVE_HEAD)]),
    ]
  })
}

function because(fault: Fault, why: string): Fault {
  return { ...fault, message: `${fault.message}${why}` }
}
