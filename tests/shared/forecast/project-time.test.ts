import { describe, expect, it } from 'vitest'
import {
  dateTime,
  dayTime,
  localText,
  momentOfLocal,
  offsetText,
} from '../../../shared/forecast/project-time'

const utc = (text: string) => Date.parse(text)

describe('a moment in the time zone of the project', () => {
  it('has its day', () => {
    expect(dayTime(utc('2031-03-04T01:41:00Z'), 'UTC')).toBe('Tue 01:41')
    expect(dayTime(utc('2031-03-03T23:41:00Z'), 'Europe/Berlin')).toBe('Tue 00:41')
    expect(dateTime(utc('2031-03-04T01:41:00Z'), 'UTC')).toBe('Tue 2031-03-04 01:41')
    expect(localText(utc('2031-03-03T23:41:00Z'), 'Europe/Berlin')).toBe('2031-03-04T00:41')
  })

  // Directive 2000/84/EC: the clock changes at 01:00 UTC on the last Sunday of March and of October,
  // 2031-03-30 and 2031-10-26.
  it('says its offset in the night in which an hour is there twice', () => {
    const zone = 'Europe/Berlin'
    expect(dayTime(utc('2031-10-26T00:30:00Z'), zone)).toBe('Sun 02:30 +02:00')
    expect(dayTime(utc('2031-10-26T01:30:00Z'), zone)).toBe('Sun 02:30 +01:00')
    expect(dayTime(utc('2031-10-25T20:00:00Z'), zone)).toBe('Sat 22:00 +02:00')
    expect(dayTime(utc('2031-10-27T12:00:00Z'), zone)).toBe('Mon 13:00')
  })

  it('says its offset in the night in which an hour is left out', () => {
    const zone = 'Europe/Lisbon'
    expect(dayTime(utc('2031-03-30T00:59:00Z'), zone)).toBe('Sun 00:59 +00:00')
    expect(dayTime(utc('2031-03-30T01:00:00Z'), zone)).toBe('Sun 02:00 +01:00')
  })

  it('refuses a time zone that is not known', () => {
    expect(() => dayTime(0, 'Ferry/Quay')).toThrow(RangeError)
  })
})

describe('a local time', () => {
  const zone = 'Europe/Berlin'

  it('is the moment at which the clock there shows it', () => {
    expect(momentOfLocal('2031-03-04T07:00', zone)).toBe(utc('2031-03-04T06:00:00Z'))
    expect(momentOfLocal('2031-07-04 07:00:30', zone)).toBe(utc('2031-07-04T05:00:30Z'))
    expect(momentOfLocal('2031-03-04T07:00', 'UTC')).toBe(utc('2031-03-04T07:00:00Z'))
  })

  it('comes back as it was written', () => {
    for (const text of ['2031-03-30T03:00', '2031-10-26T01:59', '2031-10-26T03:00']) {
      expect(localText(momentOfLocal(text, zone) as number, zone)).toBe(text)
    }
  })

  it('is no moment where the clock leaves it out, and two where it is there twice', () => {
    expect(momentOfLocal('2031-03-30T02:30', zone)).toBe('skipped')
    expect(momentOfLocal('2031-10-26T02:30', zone)).toBe('twice')
  })

  it.each(['', 'now', '2031-02-30T10:00', '2031-03-04T25:00', '04.03.2031 07:00'])(
    'is none in "%s"',
    (text) => {
      expect(momentOfLocal(text, zone)).toBe('no-time')
    },
  )
})

it('writes offsets from UTC', () => {
  expect(offsetText(0)).toBe('+00:00')
  expect(offsetText(5.5 * 3_600_000)).toBe('+05:30')
  expect(offsetText(-3_600_000)).toBe('-01:00')
})
