import { unknownIn } from '../../http/unknown-reference'

/**
 * Refuses a time zone in which no time can be printed.
 *
 * @throws OutOfRangeError that names the field.
 */
export function assertTimeZone(path: string, value: string): void {
  if (!isTimeZone(value)) throw unknownIn(path, value, 'an IANA time zone, such as Europe/Lisbon')
}

function isTimeZone(value: string): boolean {
  try {
    return new Intl.DateTimeFormat('en', { timeZone: value }).resolvedOptions().timeZone !== ''
  } catch {
    return false
  }
}
