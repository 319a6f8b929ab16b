import { isInRange, rangeFault, type AllowedRange, type Fault } from '../errors'
import type { EventSettings } from './event-settings'

/** Air temperatures that can be meant [°C]. */
export const AIR_TEMPERATURE: AllowedRange = { min: -40, max: 60, unit: '°C' }

/** Everything in the event settings of a scenario that cannot be computed. */
export function eventSettingsFaults(
  { filledAt, air }: EventSettings,
  path = 'content.event',
): readonly Fault[] {
  const outside = (field: string, value: number) =>
    isInRange(value, AIR_TEMPERATURE) ? [] : [rangeFault(field, value, AIR_TEMPERATURE)]
  return [
    ...(filledAt === null ? [] : outside(`${path}.filledAt`, filledAt)),
    ...air.flatMap(({ time, temperature }, i) => [
      ...outside(`${path}.air[${i}].temperature`, temperature),
      ...notLater(`${path}.air[${i}].time`, time, air[i - 1]?.time),
    ]),
  ]
}

function notLater(path: string, time: number, before: number | undefined): Fault[] {
  if (before === undefined || time > before) return []
  const allowed = 'after the temperature before it'
  const message = `${path}: ${time} is not allowed; it must be ${allowed}`
  return [{ path, value: time, allowed, unit: 'ms since 1970-01-01T00:00Z', message }]
}
