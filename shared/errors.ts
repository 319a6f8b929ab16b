/** What a quantity may be: the bounds are inclusive unless marked as excluded. */
export interface AllowedRange {
  readonly min: number
  readonly max: number
  readonly minExcluded?: boolean
  readonly maxExcluded?: boolean
  /** SI unit, or '–' for a pure number. */
  readonly unit: string
}

/** One refused field, in the shape that form, API and batch command all show. */
export interface Fault {
  /** Path in the case, for example `water.depth`. */
  readonly path: string
  /** The value as it arrived, so that nothing that was typed is lost. */
  readonly value: unknown
  /** What is allowed, in words: "0 to 1.05 m". */
  readonly allowed: string
  readonly unit: string
  readonly message: string
}

/** A quantity lies outside the range in which its formula holds (HTTP 422). */
export class OutOfRangeError extends Error {
  override readonly name = 'OutOfRangeError'

  constructor(readonly faults: readonly Fault[]) {
    super(faults.map((fault) => fault.message).join('\n'))
  }
}

/** The input has the wrong shape or type: not a number, a missing field, an unknown key (HTTP 400). */
export class InvalidInputError extends Error {
  override readonly name = 'InvalidInputError'

  constructor(readonly faults: readonly Fault[]) {
    super(faults.map((fault) => fault.message).join('\n'))
  }
}

/** Trims floating-point noise from a bound such as 1.5 × 0.7, for reading only. */
function readable(bound: number): string {
  return String(Number(bound.toPrecision(12)))
}

/** The range in words: "0 to 1.05 m", "above 0 m", "0.2 to 3 m". */
export function describeRange(range: AllowedRange): string {
  const unit = range.unit === '–' ? '' : ` ${range.unit}`
  if (range.min === range.max) return `${readable(range.min)}${unit}`
  const lower = `${range.minExcluded ? 'above ' : ''}${readable(range.min)}`
  if (range.max === Infinity)
    return range.minExcluded ? `${lower}${unit}` : `${lower}${unit} or more`
  const upper = `${range.maxExcluded ? 'below ' : ''}${readable(range.max)}`
  return `${lower} to ${upper}${unit}`
}

/** True where the value is a finite number inside the range. */
export function isInRange(value: number, range: AllowedRange): boolean {
  if (!Number.isFinite(value)) return false
  const aboveMin = range.minExcluded ? value > range.min : value >= range.min
  const belowMax = range.maxExcluded ? value < range.max : value <= range.max
  return aboveMin && belowMax
}

/** How an input is shown in a message: numbers bare, texts in quotation marks, nothing as "nothing". */
export function showValue(value: unknown): string {
  if (value === undefined || value === null || value === '') return 'nothing'
  if (typeof value === 'string') return `"${value.length > 40 ? `${value.slice(0, 40)}…` : value}"`
  if (typeof value === 'object') return Array.isArray(value) ? 'a list' : 'an object'
  return String(value)
}

/** The fault of a value outside its range. */
export function rangeFault(path: string, value: unknown, range: AllowedRange): Fault {
  const allowed = describeRange(range)
  const message = `${path}: ${showValue(value)} is not allowed; it must be ${allowed}`
  return { path, value, allowed, unit: range.unit, message }
}

/**
 * Refuses a value outside its range.
 *
 * @throws OutOfRangeError that names the field, the value, the range and the unit.
 */
export function assertInRange(field: string, value: number, range: AllowedRange): void {
  if (!isInRange(value, range)) throw new OutOfRangeError([rangeFault(field, value, range)])
}
