import { fromDisplay, toDisplay, type QuantityKind, type UnitSystem } from '../units'

/** The largest of 1, 2 or 5 times a power of ten that is not above the value. */
export function niceBelow(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value) + 1e-12)
  const lead = value / power
  // 1e-9: what binary arithmetic takes from 2 and 5.
  const step = lead >= 5 - 1e-9 ? 5 : lead >= 2 - 1e-9 ? 2 : 1
  return step * power
}

/** The largest SI value not above `value` that reads as a round figure in the units in which it is shown. */
export function niceShownBelow(value: number, kind: QuantityKind, system: UnitSystem): number {
  return fromDisplay(niceBelow(toDisplay(value, kind, system)), kind, system)
}

/** The smallest of 1, 2 or 5 times a power of ten that is not below the value. */
export function niceAbove(value: number): number {
  const below = niceBelow(value)
  if (below >= value * (1 - 1e-9)) return below
  const power = 10 ** Math.floor(Math.log10(below) + 1e-9)
  const lead = Math.round(below / power)
  return (lead === 1 ? 2 : lead === 2 ? 5 : 10) * power
}

/** Multiples of a nice step from 0 to the end, at most `most` of them besides 0. */
export function niceTicks(end: number, most: number): readonly number[] {
  if (!(end > 0) || most < 1) return [0]
  const step = niceAbove(end / most)
  const count = Math.floor(end / step + 1e-9)
  return Array.from({ length: count + 1 }, (_, index) => Number((index * step).toPrecision(12)))
}

/** Ticks in SI that read as round figures in the units in which they are shown. */
export function niceShownTicks(
  end: number,
  most: number,
  kind: QuantityKind,
  system: UnitSystem,
): readonly number[] {
  const shown = niceTicks(toDisplay(end, kind, system), most)
  return shown.map((tick) => fromDisplay(tick, kind, system))
}
