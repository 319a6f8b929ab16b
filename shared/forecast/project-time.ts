import { parseMoment } from '../schemas/moment'

const HOUR = 3_600_000
const DAY = 24 * HOUR

/** Formats are costly to make; one per time zone. They hold no state. */
const formats = new Map<string, Intl.DateTimeFormat>()

function formatOf(timeZone: string): Intl.DateTimeFormat {
  const kept = formats.get(timeZone)
  if (kept) return kept
  const made = new Intl.DateTimeFormat('en-GB', {
    ...{ timeZone, weekday: 'short', hourCycle: 'h23' },
    ...{ year: 'numeric', month: '2-digit', day: '2-digit' },
    ...{ hour: '2-digit', minute: '2-digit', second: '2-digit' },
  })
  formats.set(timeZone, made)
  return made
}

/** A moment as calendar and clock of a time zone have it. */
interface WallTime {
  /** "Tue" */
  readonly weekday: string
  /** "2031-03-04" */
  readonly date: string
  /** "01:41" */
  readonly clock: string
  /** What the clock is ahead of UTC [ms]. */
  readonly offset: number
}

function wallTime(moment: number, timeZone: string): WallTime {
  const parts = new Map(
    formatOf(timeZone)
      .formatToParts(moment)
      .map(({ type, value }) => [type, value]),
  )
  const part = (type: Intl.DateTimeFormatPartTypes): string => parts.get(type) ?? ''
  const date = `${part('year').padStart(4, '0')}-${part('month')}-${part('day')}`
  const clock = `${part('hour')}:${part('minute')}`
  const shown = parseMoment(`${date}T${clock}:${part('second')}Z`) ?? NaN
  const offset = (shown - Math.floor(moment / 1000)) * 1000
  return { weekday: part('weekday'), date, clock, offset }
}

/**
 * A moment with its day in the time zone of the project: "Tue 01:41". Within a day of a change of the
 * clock its offset from UTC stands beside it, because an hour is there twice, or is left out:
 * "Sun 02:30 +01:00".
 *
 * @param moment ms since 1970.
 * @param timeZone IANA name, such as Europe/Lisbon.
 * @throws RangeError for a time zone that is not known.
 */
export function dayTime(moment: number, timeZone: string): string {
  const { weekday, clock, offset } = wallTime(moment, timeZone)
  const changes = [moment - DAY, moment + DAY].some(
    (other) => wallTime(other, timeZone).offset !== offset,
  )
  return `${weekday} ${clock}${changes ? ` ${offsetText(offset)}` : ''}`
}

/** As `dayTime`, with its date: "Tue 2031-03-04 01:41". */
export function dateTime(moment: number, timeZone: string): string {
  const [weekday, ...rest] = dayTime(moment, timeZone).split(' ')
  return [weekday, wallTime(moment, timeZone).date, ...rest].join(' ')
}

/** A moment as a field for date and time has it: "2031-03-04T01:41". */
export function localText(moment: number, timeZone: string): string {
  const { date, clock } = wallTime(moment, timeZone)
  return `${date}T${clock}`
}

/** An offset from UTC: "+01:00". */
export function offsetText(offset: number): string {
  const minutes = Math.round(Math.abs(offset) / 60_000)
  const two = (value: number): string => String(value).padStart(2, '0')
  return `${offset < 0 ? '-' : '+'}${two(Math.floor(minutes / 60))}:${two(minutes % 60)}`
}

/**
 * All moments at which calendar and clock of a time zone show a local time [ms since 1970]: none in an
 * hour that the clock leaves out, two in one that is there twice.
 *
 * @param text "2031-03-04T01:41", also with a space, and with seconds.
 * @returns null for a text that is no local time.
 */
export function momentsOfLocal(text: string, timeZone: string): readonly number[] | null {
  const match = /^(\d{4}-\d{2}-\d{2})[T ](\d{2}:\d{2})(?::(\d{2})(?:\.\d+)?)?$/.exec(text.trim())
  if (!match) return null
  const [, date, clock, second = '00'] = match
  const seconds = parseMoment(`${date}T${clock}:${second}Z`)
  if (seconds === null) return null
  const asUtc = seconds * 1000
  const offsets = [asUtc - DAY, asUtc + DAY].map((near) => wallTime(near, timeZone).offset)
  return [...new Set(offsets)]
    .map((offset) => asUtc - offset)
    .filter((moment) => asUtc - moment === wallTime(moment, timeZone).offset)
    .sort((a, b) => a - b)
}

/** Why a local time names no one moment. */
export type LocalFault = 'no-time' | 'skipped' | 'twice'

/** The one moment of a local time, or why there is not exactly one; see `momentsOfLocal`. */
export function momentOfLocal(text: string, timeZone: string): number | LocalFault {
  const moments = momentsOfLocal(text, timeZone)
  if (!moments) return 'no-time'
  if (moments.length === 0) return 'skipped'
  return moments.length > 1 ? 'twice' : moments[0]!
}
