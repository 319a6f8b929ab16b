import type { SheetFigure } from './line'
import type { UnitSystem } from '../units'
import { sheetUnit, type FigureKind } from './sheet-units'

/** A number as it is printed: digits, and a power of ten where it has one. */
export interface PrintedNumber {
  /** With a true minus sign. */
  readonly digits: string
  /** Power of ten; 0: none. */
  readonly exponent: number
}

/** Figures below this are printed with a power of ten. */
const SMALLEST_PLAIN = 1e-3
/** Digits of a length: to 1 mm, or to 0.01 ft. */
const LENGTH_DECIMALS = { metric: 3, us: 2 } as const
/** Binary noise below a last digit. */
const NOISE = 1e-7

function signed(text: string): string {
  return text.startsWith('-') ? `−${text.slice(1)}` : text
}

/** Thousands apart by a narrow space, from five digits. */
function grouped(digits: string): string {
  const [whole = '', fraction] = digits.split('.')
  const spaced =
    whole.replace('-', '').length > 4 ? whole.replace(/\B(?=(\d{3})+(?!\d))/g, '\u202f') : whole
  return fraction === undefined ? spaced : `${spaced}.${fraction}`
}

/** A number to so many significant figures: 0.865, 8.13, 10 800, 5.33 · 10⁻⁵. */
export function significant(value: number, figures: number): PrintedNumber {
  if (value === 0) return { digits: '0', exponent: 0 }
  const rounded = Number(value.toPrecision(figures))
  if (Math.abs(rounded) < SMALLEST_PLAIN || Math.abs(rounded) >= 1e7) {
    const [mantissa = '', power = '0'] = value.toExponential(figures - 1).split('e')
    return { digits: signed(mantissa), exponent: Number(power) }
  }
  const decimals = Math.max(0, figures - 1 - Math.floor(Math.log10(Math.abs(rounded))))
  return { digits: signed(grouped(rounded.toFixed(decimals))), exponent: 0 }
}

/** An input as it was entered: up to six figures, no trailing zeros. */
function entered(value: number, system: UnitSystem): PrintedNumber {
  const kept = Number(value.toPrecision(system === 'metric' ? 6 : 4))
  if (kept !== 0 && Math.abs(kept) < SMALLEST_PLAIN) return significant(kept, 3)
  return { digits: signed(grouped(String(kept))), exponent: 0 }
}

function asLength(
  value: number,
  decimals: number,
  rounding: SheetFigure['rounding'],
): PrintedNumber {
  const scale = 10 ** decimals
  const scaled = rounding === 'down' ? Math.floor(value * scale + NOISE) : Math.round(value * scale)
  return { digits: signed((scaled / scale).toFixed(decimals)), exponent: 0 }
}

/** The printed number of a figure: three significant figures, lengths to 1 mm, inputs as entered. */
export function printedNumber(figure: SheetFigure, system: UnitSystem): PrintedNumber {
  if (figure.kind === 'length')
    return asLength(figure.value, LENGTH_DECIMALS[system], figure.rounding)
  return figure.isGiven ? entered(figure.value, system) : significant(figure.value, 3)
}

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹'

/** "5.33 · 10⁻⁵". */
export function plainNumber({ digits, exponent }: PrintedNumber): string {
  if (exponent === 0) return digits
  const power = [...String(Math.abs(exponent))].map((digit) => SUPERSCRIPTS[Number(digit)])
  return `${digits} · 10${exponent < 0 ? '⁻' : ''}${power.join('')}`
}

/** Label of the unit of a kind of figure; empty for a pure number. */
export function figureUnit(kind: FigureKind, system: UnitSystem): string {
  return sheetUnit(kind, system).label
}
