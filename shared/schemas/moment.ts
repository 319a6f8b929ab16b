const MOMENT =
  /^(\d{4})-(\d{2})-(\d{2})T(\d{2}):(\d{2})(?::(\d{2})(\.\d{1,9})?)?(Z|([+-])(\d{2}):(\d{2}))$/

const DAY = 86_400

/** How a moment is written, for messages. */
export const MOMENT_FORM = 'a moment with its offset from UTC, such as 2031-03-03T22:00:00+01:00'

/**
 * A moment from text after ISO 8601, with its offset from UTC: `2031-03-03T22:00:00+01:00` or `…Z`.
 *
 * @returns Seconds since 1970-01-01T00:00Z; null where the text is no moment or has no offset.
 */
export function parseMoment(text: string): number | null {
  const match = MOMENT.exec(text)
  if (!match) return null
  const part = (i: number): number => Number(match[i] ?? 0)
  const [year, month, day] = [part(1), part(2), part(3)]
  const [hour, minute, second] = [part(4), part(5), part(6) + part(7)]
  const isDay = month >= 1 && month <= 12 && day >= 1 && day <= daysOf(year, month)
  const isTime = hour < 24 && minute < 60 && second < 60 && part(10) < 24 && part(11) < 60
  if (!isDay || !isTime) return null
  const offset = (match[9] === '-' ? -1 : 1) * (part(10) * 3600 + part(11) * 60)
  return daysFrom(year, month, day) * DAY + hour * 3600 + minute * 60 + second - offset
}

/** A moment as text in UTC, to the second: `2031-03-03T21:00:00Z`. */
export function momentText(moment: number): string {
  const seconds = Math.round(moment)
  const days = Math.floor(seconds / DAY)
  const rest = seconds - days * DAY
  const [year, month, day] = civilOf(days)
  const two = (value: number): string => String(value).padStart(2, '0')
  const date = `${String(year).padStart(4, '0')}-${two(month)}-${two(day)}`
  const time = [rest / 3600, (rest % 3600) / 60, rest % 60].map((value) => two(Math.floor(value)))
  return `${date}T${time.join(':')}Z`
}

function daysOf(year: number, month: number): number {
  if (month !== 2) return [4, 6, 9, 11].includes(month) ? 30 : 31
  return year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0) ? 29 : 28
}

/** Days since 1970-01-01 in the Gregorian calendar; years are counted from March. */
function daysFrom(year: number, month: number, day: number): number {
  const y = month <= 2 ? year - 1 : year
  const era = Math.floor(y / 400)
  const yearOfEra = y - era * 400
  const dayOfYear = Math.floor((153 * ((month + 9) % 12) + 2) / 5) + day - 1
  const leaps = Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100)
  return era * 146_097 + yearOfEra * 365 + leaps + dayOfYear - 719_468
}

/** The inverse of `daysFrom`. */
function civilOf(days: number): readonly [year: number, month: number, day: number] {
  const shifted = days + 719_468
  const era = Math.floor(shifted / 146_097)
  const doe = shifted - era * 146_097
  const yearOfEra = Math.floor(
    (doe - Math.floor(doe / 1460) + Math.floor(doe / 36_524) - Math.floor(doe / 146_096)) / 365,
  )
  const leaps = Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100)
  const dayOfYear = doe - (365 * yearOfEra + leaps)
  const m = Math.floor((5 * dayOfYear + 2) / 153)
  const month = m < 10 ? m + 3 : m - 9
  const year = yearOfEra + era * 400 + (month <= 2 ? 1 : 0)
  return [year, month, dayOfYear - Math.floor((153 * m + 2) / 5) + 1]
}
