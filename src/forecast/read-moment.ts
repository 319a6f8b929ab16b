import { momentOfLocal, type LocalFault } from '@shared/forecast/project-time'
import { parseMoment } from '@shared/schemas/moment'

/** Order of the parts of a date with slashes. */
export type DateOrder = 'dmy' | 'mdy'

/** How times of a file are to be read. */
export interface MomentChoice {
  /** Time zone, or offset from UTC such as "+01:00", of times that carry none; empty: not said yet. */
  readonly zone: string
  readonly dateOrder: DateOrder
}

export type MomentFault = LocalFault | 'no-offset'

const CLOCK = String.raw`(\d{1,2}):(\d{2})(?::(\d{2})(?:[.,]\d+)?)?`
const OFFSET = String.raw`\s*(Z|UTC|[+-]\d{2}:?\d{2})?`
const YEAR_FIRST = new RegExp(
  String.raw`^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})[T ]+${CLOCK}${OFFSET}$`,
  'i',
)
const YEAR_LAST = new RegExp(
  String.raw`^(\d{1,2})([./-])(\d{1,2})[./-](\d{4})[T ,]+${CLOCK}${OFFSET}$`,
  'i',
)

/** True for a date whose day and month cannot be told apart by its form: with slashes, year last. */
export function isUnclearDate(text: string): boolean {
  return YEAR_LAST.exec(text.trim())?.[2] === '/'
}

/** True for a time that carries its offset from UTC. */
export function hasOffset(text: string): boolean {
  return (partsOf(text, 'dmy')?.offset ?? null) !== null
}

/** A moment of a file [ms since 1970], or why it is none. */
export function readMoment(text: string, { zone, dateOrder }: MomentChoice): number | MomentFault {
  const parts = partsOf(text, dateOrder)
  if (!parts) return 'no-time'
  const { local, offset } = parts
  if (offset !== null) return exactMoment(local, offset)
  if (zone === '') return 'no-offset'
  return /^[+-]/.test(zone) ? exactMoment(local, zone) : momentOfLocal(local, zone)
}

function exactMoment(local: string, offset: string): number | MomentFault {
  const moment = parseMoment(`${local}${offset}`)
  return moment === null ? 'no-time' : moment * 1000
}

interface Parts {
  /** "2031-03-03T22:00:00" */
  readonly local: string
  /** "Z" or "+01:00" */
  readonly offset: string | null
}

function partsOf(text: string, order: DateOrder): Parts | null {
  const trimmed = text.trim()
  const first = YEAR_FIRST.exec(trimmed)
  if (first) {
    const [, year, month, day, ...rest] = first
    return written([year!, month!, day!], rest)
  }
  const last = YEAR_LAST.exec(trimmed)
  if (!last) return null
  const [, a, sign, b, year, ...rest] = last
  const isMonthFirst = sign === '/' && order === 'mdy'
  return written(isMonthFirst ? [year!, a!, b!] : [year!, b!, a!], rest)
}

type Clock = readonly (string | undefined)[]

function written(date: readonly string[], [hour, minute, second = '00', offset]: Clock): Parts {
  const two = (part: string) => part.padStart(2, '0')
  const local = `${date.map(two).join('-')}T${two(hour!)}:${minute}:${second}`
  return { local, offset: offset === undefined ? null : offsetOf(offset) }
}

function offsetOf(text: string): string {
  if (/^(Z|UTC)$/i.test(text)) return 'Z'
  return text.includes(':') ? text : `${text.slice(0, 3)}:${text.slice(3)}`
}
