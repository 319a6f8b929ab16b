import { z } from 'zod'
import { isInRange, rangeFault, type AllowedRange, type Fault } from '../errors'
import { pumpSystemFaults, pumpSystemSchema } from './flow-case'

const LEVEL: AllowedRange = { min: -500, max: 9000, unit: 'm' }
const FLOW: AllowedRange = { min: 0, max: 1000, unit: 'm³/s' }
const AREA: AllowedRange = { min: 0, minExcluded: true, max: 1e9, unit: 'm²' }
const DURATION: AllowedRange = { min: 1, max: 31_622_400, unit: 's' }

const measured = (range: AllowedRange, description: string) =>
  z.number().meta({ description, unit: range.unit })

const pondPumpSchema = z.strictObject({
  name: z.string().trim().min(1).max(80),
  startLevel: measured(LEVEL, 'Pond level at which it starts'),
  stopLevel: measured(LEVEL, 'Pond level at which it stops, below the start'),
  flow: measured(FLOW, 'What it delivers, where no curve is given').optional(),
  outletLevel: measured(LEVEL, 'Level over which its hose leads; with `system`').optional(),
  system: pumpSystemSchema.optional().meta({ description: 'Curve and hose, instead of `flow`' }),
  failsAt: measured(DURATION, 'Moment at which it breaks down').optional(),
})

/** A pond on the dry side through time. */
export const pondingCaseSchema = z
  .strictObject({
    command: z.literal('ponding').optional().meta({ description: 'Must match the batch command' }),
    area: measured(AREA, 'Water surface, the same at all levels').optional(),
    areaTable: z
      .array(z.tuple([measured(LEVEL, 'Level'), measured(AREA, 'Water surface')]))
      .optional()
      .meta({ description: 'Level and water surface, levels rising; instead of `area`' }),
    inflow: z
      .union([
        measured(FLOW, 'Constant inflow'),
        z.array(z.tuple([z.number().meta({ unit: 's' }), measured(FLOW, 'Inflow')])),
      ])
      .meta({ description: 'Constant, or time and inflow, straight between' }),
    pump: measured(FLOW, 'Flow of the one pump; 0: none').default(0),
    startLevel: measured(LEVEL, 'Pond level at which it starts').optional(),
    stopLevel: measured(LEVEL, 'Pond level at which it stops').optional(),
    pumps: z.array(pondPumpSchema).max(20).default([]).meta({ description: 'Further pumps' }),
    initialLevel: measured(LEVEL, 'Pond level at the start').default(0),
    duration: measured(DURATION, 'Time looked at'),
    step: measured(DURATION, 'Longest step').default(60),
    thresholds: z
      .array(measured(LEVEL, 'Level of which the first moment is asked for'))
      .max(20)
      .default([]),
  })
  .meta({ id: 'PondingCase', description: 'A pond and its pumps, SI units' })
export type PondingCase = z.output<typeof pondingCaseSchema>

const moment = z.number().meta({ unit: 's' })
const volume = z.number().meta({ unit: 'm³' })

export const pondingResultSchema = z
  .strictObject({
    levelAtEnd: z.number().meta({ unit: 'm' }),
    highest: z.strictObject({ time: moment, level: z.number().meta({ unit: 'm' }) }),
    firstStart: moment.nullable(),
    firstStop: moment.nullable(),
    secondStart: moment.nullable(),
    inflowVolume: volume,
    pumpedVolume: volume,
    stored: volume,
    events: z.array(
      z.strictObject({
        time: moment,
        pump: z.string(),
        what: z.enum(['starts', 'stops', 'fails']),
      }),
    ),
    pumps: z.array(z.strictObject({ pump: z.string(), volume, runningTime: moment })),
    reaches: z.array(
      z.strictObject({ level: z.number().meta({ unit: 'm' }), time: moment.nullable() }),
    ),
  })
  .meta({ id: 'PondingResult', description: 'inflowVolume = pumpedVolume + stored' })

/** Everything in a ponding case that cannot be computed; the pond itself refuses the rest. */
export function pondingFaults(pond: PondingCase): readonly Fault[] {
  const { area, areaTable, inflow, pump, startLevel, stopLevel, duration, step } = pond
  const pumpLevel = pump > 0 ? LEVEL : null
  return [
    ...(areaTable === undefined ? outside('area', area, AREA) : tableFaults(area, areaTable)),
    ...(typeof inflow === 'number' ? outside('inflow', inflow, FLOW) : inflowFaults(inflow)),
    ...outside('pump', pump, FLOW),
    ...(pumpLevel ? outside('startLevel', startLevel, LEVEL) : []),
    ...(pumpLevel ? outside('stopLevel', stopLevel, { ...LEVEL, ...below(startLevel) }) : []),
    ...pond.pumps.flatMap(pumpFaults),
    ...outside('initialLevel', pond.initialLevel, LEVEL),
    ...outside('duration', duration, DURATION),
    ...outside('step', step, { ...DURATION, min: Math.max(1, duration / 1_000_000) }),
    ...pond.thresholds.flatMap((level, i) => outside(`thresholds[${i}]`, level, LEVEL)),
  ]
}

function outside(path: string, value: number | undefined, range: AllowedRange): Fault[] {
  return value !== undefined && isInRange(value, range) ? [] : [rangeFault(path, value, range)]
}

function below(start: number | undefined) {
  return start === undefined ? {} : { max: start, maxExcluded: true }
}

type Table = NonNullable<PondingCase['areaTable']>

function tableFaults(area: number | undefined, table: Table): Fault[] {
  if (area !== undefined) {
    const allowed = 'left out where areaTable is given'
    const message = `area: ${area} is not allowed; it must be ${allowed}`
    return [{ path: 'area', value: area, allowed, unit: 'm²', message }]
  }
  const rows = { min: 1, max: 1000, unit: 'rows' }
  if (!isInRange(table.length, rows)) return [rangeFault('areaTable.length', table.length, rows)]
  return table.flatMap(([level, surface], i) => {
    const before = table[i - 1]?.[0]
    const rising = before === undefined ? LEVEL : { ...LEVEL, min: before, minExcluded: true }
    const isLast = i === table.length - 1
    return [
      ...outside(`areaTable[${i}][0]`, level, rising),
      ...outside(`areaTable[${i}][1]`, surface, { ...AREA, minExcluded: isLast }),
    ]
  })
}

function inflowFaults(inflow: readonly (readonly [number, number])[]): Fault[] {
  const rows = { min: 1, max: 100_000, unit: 'rows' }
  if (!isInRange(inflow.length, rows)) return [rangeFault('inflow.length', inflow.length, rows)]
  const faults = inflow.flatMap(([time, flow], i) => {
    const before = inflow[i - 1]?.[0] ?? -Infinity
    const range = { min: before, minExcluded: true, max: Infinity, unit: 's' }
    return [...outside(`inflow[${i}][0]`, time, range), ...outside(`inflow[${i}][1]`, flow, FLOW)]
  })
  return faults.slice(0, 20)
}

function pumpFaults(pump: PondingCase['pumps'][number], i: number): readonly Fault[] {
  const path = `pumps[${i}]`
  const { startLevel, stopLevel, flow, outletLevel, system, failsAt } = pump
  return [
    ...outside(`${path}.startLevel`, startLevel, LEVEL),
    ...outside(`${path}.stopLevel`, stopLevel, { ...LEVEL, ...below(startLevel) }),
    ...(system === undefined
      ? outside(`${path}.flow`, flow, FLOW)
      : [
          ...outside(`${path}.outletLevel`, outletLevel, LEVEL),
          ...pumpSystemFaults(system, `${path}.system.`),
        ]),
    ...(failsAt === undefined ? [] : outside(`${path}.failsAt`, failsAt, { ...DURATION, min: 0 })),
  ]
}
