import type { Message, TextValue } from '../texts/format-text'
import { FOOT, type Quantity, type QuantityKind, type UnitSystem } from '../units'
import { comparisonFor } from './everyday'
import type { DemoGround, DemoSetting } from './setting'

/** What a scene says once the water is there. */
export interface SceneFigures {
  /** The answer in everyday units. */
  readonly head: Message
  /** What it means, a line or two. */
  readonly lines: readonly Message[]
  /** The same as engineers write it, in small type. */
  readonly exact: Message
  /** As heavy, as fast, as much as what; null where nothing fits. */
  readonly comparison: Message | null
}

/** What the figures of a scene are worked out from. */
export interface Shown {
  readonly setting: DemoSetting
  readonly start: DemoSetting
  readonly units: UnitSystem
}

/** A message of the demonstrator's texts. */
export function said(key: string, values?: Readonly<Record<string, TextValue>>): Message {
  return values ? { key: `demonstrator.${key}`, values } : { key: `demonstrator.${key}` }
}

/** A quantity in the digits of a sheet, or in fewer. */
export function quantity(value: number, kind: QuantityKind, decimals?: number): Quantity {
  return decimals === undefined ? { value, kind } : { value, kind, decimals }
}

/** A limit: rounded down to the last digit that is printed. */
export function limit(depth: number): Quantity {
  return { value: depth, kind: 'length', rounding: 'down' }
}

/** A mass on one metre, or one foot, of barrier [kg, from kg/m]. */
export function massOnRun(mass: number, units: UnitSystem): Quantity {
  return { value: mass * (units === 'us' ? FOOT : 1), kind: 'mass' }
}

/** A mass with "on every metre" or "foot" behind it, as the reader's units have it. */
export function perRun(key: string, mass: number, units: UnitSystem): Message {
  return said(`${key}.${units}`, { mass: massOnRun(mass, units) })
}

/** "as heavy as 2.0 grown-ups of 75 kg"; null below anything that has a name. */
export function asHeavyAs(mass: number, units: UnitSystem): Message | null {
  const found = comparisonFor(massOnRun(mass, units).value)
  if (!found) return null
  return said(`heavy.${found.thing.id}`, {
    count: quantity(found.count, 'ratio', 1),
    each: quantity(found.thing.mass, 'mass'),
  })
}

/** What a ground is called. */
export function groundName({ id, name }: DemoGround): Message {
  return name === undefined ? said(`ground.${id}`) : said('verbatim', { text: name })
}
