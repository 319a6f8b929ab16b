import type { AllowedRange } from '@shared/errors'
import {
  displayDecimals,
  fromDisplay,
  toDisplay,
  unitLabel,
  type QuantityKind,
  type UnitSystem,
} from '@shared/units'
import { parseNumber } from './parse-number'

/** A field of the form: what was typed while it stands, and what it means in SI. */
export interface FieldState {
  /** Verbatim; null while the field shows a value that came from elsewhere. */
  readonly typed: string | null
  /** SI; null: empty, undefined: no number. */
  readonly value: number | null | undefined
}

/** What a typed text means. */
export function readTyped(typed: string, kind: QuantityKind, system: UnitSystem): FieldState {
  const parsed = parseNumber(typed)
  if (parsed.is === 'text') return { typed, value: undefined }
  if (parsed.is === 'empty') return { typed, value: null }
  return { typed, value: tidyDigits(fromDisplay(parsed.value, kind, system)) }
}

/** 15.3 kPa is 15300 Pa, not 15300.000000000002: keeps fifteen digits, more than anybody types. */
function tidyDigits(value: number): number {
  return Number.isFinite(value) ? Number(value.toPrecision(15)) : value
}

/** A value as it stands in its field: complete in metric units, to one digit more than a result in the others. */
export function fieldText(value: number, kind: QuantityKind, system: UnitSystem): string {
  const shown = toDisplay(value, kind, system)
  const digits = displayDecimals(kind, system) + 1
  const rounded =
    system === 'metric' || Math.abs(shown) < 10 ** -digits
      ? Number(shown.toPrecision(system === 'metric' ? 10 : 4))
      : Number(shown.toFixed(digits))
  return String(rounded)
}

/** A figure as it was given, with its unit: "0.70 m", "10 m", "15 kPa"; no digits that nobody entered. */
export function givenText(value: number, kind: QuantityKind, system: UnitSystem): string {
  const text = fieldText(value, kind, system)
  const label = unitLabel(kind, system)
  const isShort = kind === 'length' && Math.abs(Number(text)) < 10 && /^[^.]*(\.\d?)?$/.test(text)
  const figure = (isShort ? Number(text).toFixed(2) : text).replace('-', '−')
  return label === '' ? figure : `${figure}\u00a0${label}`
}

/** What the field shows. */
export function shownText(state: FieldState, kind: QuantityKind, system: UnitSystem): string {
  if (state.typed !== null) return state.typed
  return typeof state.value === 'number' ? fieldText(state.value, kind, system) : ''
}

/** Bounds of a range in display units, rounded inwards so that a bound that is read can be typed. */
export function shownBounds(range: AllowedRange, kind: QuantityKind, system: UnitSystem) {
  const scale = 10 ** displayDecimals(kind, system)
  const inward = (value: number, round: (scaled: number) => number, noise: number) => {
    const shown = toDisplay(value, kind, system)
    if (system === 'metric') return Number(shown.toPrecision(10))
    return round(shown * scale + noise) / scale
  }
  return {
    min: inward(range.min, Math.ceil, -1e-9),
    max: inward(range.max, Math.floor, 1e-9),
  }
}

/** The text one step up or down: one hundredth for most, in the last digit that is shown for coarser figures; none for the tiny ones. */
export function stepped(
  state: FieldState,
  direction: 1 | -1,
  kind: QuantityKind,
  system: UnitSystem,
): string | null {
  if (typeof state.value !== 'number' || !Number.isFinite(state.value)) return null
  const decimals = Math.min(displayDecimals(kind, system), 2)
  const now = toDisplay(state.value, kind, system)
  const step = 10 ** -decimals
  if (now !== 0 && Math.abs(now) < step) return null
  const shown = now + direction * step
  return String(Number(shown.toFixed(Math.max(decimals, 4))))
}
