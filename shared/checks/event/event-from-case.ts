import type { KnownReading, Reading } from '../../calc/series/time-series'
import { showValue, type Fault } from '../../errors'
import type { EventCase, EventResult } from '../../schemas/event-case'
import { MOMENT_FORM, momentText, parseMoment } from '../../schemas/moment'
import type { SectionCase } from '../../schemas/section-case'
import { sectionFaults } from '../../schemas/section-faults'
import { FOOT } from '../../units'
import type { EventAnswer, Failure } from './event-answer'
import { eventFaults } from './event-faults'
import type { EventInput } from './event-input'
import { momentsOf } from './event-trace'

/** Faults of one kind that are told one by one. */
const MOST_TOLD = 20

/**
 * Everything in a case that cannot be computed: moments without offset, the section outside its
 * ranges, whatever `eventFaults` refuses, and levels that can only be in another unit or datum.
 */
export function eventCaseFaults(event: EventCase): readonly Fault[] {
  const faults = [
    ...momentFaults(event),
    ...sectionFaults(sectionOf(event)).map((fault) => inside('section', fault)),
  ]
  if (faults.length > 0) return faults
  const input = eventInputOf(event)
  const own = eventFaults(input).map((fault) => asSent(event, fault))
  return own.length > 0 ? own : strangeLevels(event, input)
}

/**
 * The input of an event from a case as it is sent: seconds, metres.
 *
 * @remarks Expects moments that can be read, see `eventCaseFaults`.
 */
export function eventInputOf(event: EventCase): EventInput {
  const { groundLevel, water, pond, air, step, timeToClear, groundBefore } = event
  return {
    section: sectionOf(event),
    groundLevel,
    water: levelsOf(water),
    step,
    timeToClear,
    groundBefore,
    ...(pond ? { pond: known(levelsOf(pond)) } : {}),
    ...(air ? { air: airOf(air) } : {}),
  }
}

/** The answer as it is sent: moments as text. */
export function eventResultOf(answer: EventAnswer): EventResult {
  const { trace, ...rest } = answer
  const at = <T extends { readonly time: number }>(moment: T) => ({
    ...moment,
    time: momentText(moment.time),
  })
  return {
    ...rest,
    worst: at(rest.worst),
    firstFailure: rest.firstFailure && failureText(rest.firstFailure),
    failures: rest.failures.map(failureText),
    leastSliding: rest.leastSliding && at(rest.leastSliding),
    leastFreeboard: rest.leastFreeboard && at(rest.leastFreeboard),
    highestLevel: at(rest.highestLevel),
    lowestAirPressure: at(rest.lowestAirPressure),
    leave: { ...rest.leave, time: rest.leave.time === null ? null : momentText(rest.leave.time) },
    gaps: rest.gaps.map(({ from, to }) => ({ from: momentText(from), to: momentText(to) })),
    moments: momentsOf(trace).map(at),
  }
}

function failureText({ from, to, ...failure }: Failure) {
  return { ...failure, from: momentText(from), to: to === null ? null : momentText(to) }
}

function sectionOf({ section }: EventCase): SectionCase {
  const { water, uplift } = section
  return {
    ...section,
    water: { ...water, depth: 0, dryDepth: 0 },
    uplift: { ...uplift, time: 0 },
  }
}

type Levels = EventCase['water']

function levelsOf({ unit, readings }: Levels): readonly Reading[] {
  const factor = unit === 'ft' ? FOOT : 1
  return readings.map(({ time, level }) => ({
    time: parseMoment(time) ?? NaN,
    value: level === null ? null : level * factor,
  }))
}

/** A pond is straight across its gaps. */
function known(readings: readonly Reading[]): readonly KnownReading[] {
  return readings.flatMap(({ time, value }) => (value === null ? [] : [{ time, value }]))
}

type Air = NonNullable<EventInput['air']>

function airOf({ filledAt, readings, leak }: NonNullable<EventCase['air']>): Air {
  const temperature = readings.map((reading) => ({
    time: parseMoment(reading.time) ?? NaN,
    value: reading.temperature,
  }))
  if (!leak) return { filledAt, temperature }
  const { compressor, ...tight } = leak
  return { filledAt, temperature, leak: compressor ? { ...tight, compressor } : tight }
}

function momentFaults({ water, pond, air }: EventCase): readonly Fault[] {
  const series = [
    ['water', water.readings],
    ['pond', pond?.readings ?? []],
    ['air', air?.readings ?? []],
  ] as const
  const issued = [
    ['water.issued', water.issued],
    ['pond.issued', pond?.issued],
  ] as const
  return [
    ...issued.flatMap(([path, text]) => (text === undefined ? [] : momentFault(path, text))),
    ...series.flatMap(([name, readings]) =>
      readings
        .flatMap(({ time }, i) => momentFault(`${name}.readings[${i}].time`, time))
        .slice(0, MOST_TOLD),
    ),
  ]
}

function momentFault(path: string, value: string): Fault[] {
  if (parseMoment(value) !== null) return []
  const message = `${path}: ${showValue(value)} is not allowed; it must be ${MOMENT_FORM}`
  return [{ path, value, allowed: MOMENT_FORM, unit: '–', message }]
}

const READING = /^(water|pond|air)\.readings\[(\d+)\]\.time$/

/** A reading out of its turn in the words in which it was sent, not in seconds. */
function asSent(event: EventCase, fault: Fault): Fault {
  const [, name, index] = READING.exec(fault.path) ?? []
  if (name === undefined) return fault
  const readings = event[name as 'water' | 'pond' | 'air']?.readings ?? []
  const [before = '', sent = ''] = [Number(index) - 1, Number(index)].map((i) => readings[i]?.time)
  const isTwice = parseMoment(before) === parseMoment(sent)
  const what = isTwice ? 'the same moment twice' : showValue(sent)
  const allowed = `after the reading before it, ${showValue(before)}`
  const message = `${fault.path}: ${what} is not allowed; it must be ${allowed}`
  return { ...fault, value: sent, allowed, unit: '–', message }
}

/** Water that never is below 1.5 diameters above the ground is in feet, or in another datum. */
function strangeLevels({ section, water }: EventCase, { groundLevel, water: levels }: EventInput) {
  const lowest = levels.reduce((least, { value }) => Math.min(least, value ?? Infinity), Infinity)
  const limit = groundLevel + 1.5 * section.barrier.diameter
  if (lowest <= limit) return []
  const path = 'water.readings'
  const allowed = `below ${limit.toFixed(3)} m at one reading or more: check unit and datum`
  const message = `${path}: ${lowest.toFixed(3)} m at the least (unit ${water.unit}) is not allowed; it must be ${allowed}`
  return [{ path, value: lowest, allowed, unit: 'm', message }]
}

function inside(path: string, fault: Fault): Fault {
  return { ...fault, path: `${path}.${fault.path}`, message: `${path}.${fault.message}` }
}
