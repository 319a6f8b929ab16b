import { dayTime } from '../forecast/project-time'
import type { Order } from '../schemas/order'
import { checksTexts } from '../texts/checks.en'
import { textResolver, type ResolveText } from '../texts/format-text'
import { orderTexts } from '../texts/order.en'
import { shellTexts } from '../texts/shell.en'
import { formatQuantity, type Quantity } from '../units'
import type { OrderWords } from './order-document'

/** Every text that an order says something with. */
export const ORDER_TEXTS = {
  checks: checksTexts,
  deploymentOrder: orderTexts,
  shell: shellTexts,
} as const

/** Turns the texts of drawings and orders into words. */
export function orderResolver(system: Order['units']): ResolveText {
  return textResolver(ORDER_TEXTS, system)
}

/** Words, quantities and times of an order: its units, its datum, the time zone of its project. */
export function orderWords({
  units,
  datum,
  timeZone,
}: Pick<Order, 'units' | 'datum' | 'timeZone'>): OrderWords {
  const resolve = orderResolver(units)
  const show = (quantity: Quantity) => formatQuantity(quantity, units)
  const length = (value: number, more: Partial<Quantity> = {}) =>
    show({ value, kind: 'length', ...more })
  return {
    say: (key, values) => resolve(values ? { key, values } : { key }),
    level: (value, rounding) =>
      `${length(value, rounding ? { rounding } : {})}${datum === '' ? '' : ` ${datum}`}`,
    stage: (value, rounding) => length(value, { decimals: 2, ...(rounding ? { rounding } : {}) }),
    size: (value) => length(value, { decimals: 2 }),
    height: (value) => length(value, { decimals: 2, rounding: 'up' }),
    pressure: (value, rounding) =>
      show({ value, kind: 'pressure', ...(rounding ? { rounding } : {}) }),
    mass: (value) => show({ value, kind: 'mass', rounding: 'up' }),
    speed: (value) => show({ value, kind: 'speed', decimals: 0 }),
    diameter: (value) => show({ value, kind: 'smallLength', decimals: 0 }),
    chainage: (value) => length(value, { isBare: true, decimals: isWhole(value) ? 0 : 1 }),
    time: (moment) => dayTime(moment, timeZone),
    minutes: (value) =>
      resolve({ key: 'deploymentOrder.times.minutes', values: { count: Math.round(value / 60) } }),
  }
}

function isWhole(value: number): boolean {
  return Math.abs(value - Math.round(value)) < 0.05
}
