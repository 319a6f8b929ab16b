import { OutOfRangeError, showValue } from '../../shared/errors'

/** The error of a field that names something which is not there, or may not be named. */
export function unknownIn(path: string, value: unknown, allowed: string): OutOfRangeError {
  const message = `${path}: ${showValue(value)} is not allowed; it must be ${allowed}`
  return new OutOfRangeError([{ path, value, allowed, unit: '–', message }])
}
