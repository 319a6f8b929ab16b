import type { Figure } from './formula'

/** Superscript digits are for reading; a typesetter wants powers. */
const POWERS: Readonly<Record<string, string>> = { '²': '^2', '³': '^3' }

/** A unit as TeX; nothing for a pure number. */
export function unitTex(unit: string): string {
  if (unit === '–') return ''
  const words = unit
    .replace(/[²³]/g, (power) => POWERS[power]!)
    .replaceAll('°', '{}^{\\circ}')
    .replaceAll('√Pa', '\\sqrt{Pa}')
    .replaceAll('·', '\\,')
    .replaceAll('%', '\\%')
    .replaceAll(' per ', '\\ per\\ ')
    .replaceAll(' ', '\\,')
  return `\\mathrm{${words}}`
}

/** A number as TeX: five digits that count, powers of ten where it is very large or very small. */
export function numberTex(value: number, digits = 5): string {
  if (value === 0) return '0'
  const size = Math.abs(value)
  if (size < 1e-3 || size >= 1e6) {
    const [lead = '', power = ''] = value.toExponential(digits - 1).split('e')
    return `${Number(lead)}\\times10^{${Number(power)}}`
  }
  return Number(value.toPrecision(digits)).toLocaleString('en-GB', {
    useGrouping: false,
    maximumFractionDigits: 12,
  })
}

/** Digits of a figure that is given: as many as it was given with. */
const GIVEN_DIGITS = 9

/** "F_h = 1484 N/m" as TeX. */
export function figureTex(figure: Figure, digits?: number): string {
  const unit = unitTex(figure.unit)
  const number = numberTex(figure.value, digits)
  return `${figure.tex} = ${number}${unit === '' ? '' : `\\,${unit}`}`
}

/** A given figure as TeX, not rounded. */
export function givenTex(figure: Figure): string {
  return figureTex(figure, GIVEN_DIGITS)
}
