import { describe, expect, it } from 'vitest'
import { matchForecastColumns } from '@/forecast/forecast-columns'
import { readingsWarnings } from '@/forecast/forecast-rows'
import { readForecastTable, type TableChoice } from '@/forecast/read-forecast-table'
import { hasOffset, isUnclearDate, readMoment } from '@/forecast/read-moment'
import { decimalOf } from '@/survey/read-stations'
import { readTable } from '@/survey/read-table'

function read(text: string, changes: Partial<TableChoice> = {}) {
  const table = readTable(text)
  const { hasHeading, match } = matchForecastColumns(table)
  const decimal = decimalOf(table)
  const how = { zone: '', dateOrder: 'dmy', unit: 'm' } as const
  return readForecastTable(table, { hasHeading, match, decimal, ...how, ...changes })
}

const at = (hour: number, minute = 0) => Date.UTC(2031, 2, 3, hour, minute)

const PLAIN = `time,level,low,high
2031-03-03T22:00:00Z,2.34,,
2031-03-03T23:00:00Z,2.43,2.31,2.55
2031-03-04T00:00:00Z,2.54,2.42,2.66
`

describe('a table of a forecast', () => {
  it('is read with its band, an empty cell as nothing', () => {
    expect(read(PLAIN)).toEqual({
      faults: [],
      observed: [],
      readings: [
        { time: at(22), expected: 2.34, low: null, high: null },
        { time: at(23), expected: 2.43, low: 2.31, high: 2.55 },
        { time: at(24), expected: 2.54, low: 2.42, high: 2.66 },
      ],
    })
  })

  it('may part cells by semicolons, use decimal commas, and part day and clock', () => {
    const text = 'Date;Time;Water level\n03.03.2031;23:00;2,43\n04.03.2031;00:00;2,54\n'
    const { readings } = read(text, { zone: '+01:00' })
    expect(readings.map(({ time, expected }) => [time, expected])).toEqual([
      [at(22), 2.43],
      [at(23), 2.54],
    ])
  })

  it('may come without a heading, and in feet', () => {
    const text = '2031-03-03 22:00Z\t10\n2031-03-03 23:00Z\t11\n'
    // 10 ft are 3.048 m exactly: NIST SP 811, appendix B.
    expect(read(text, { unit: 'ft' }).readings.map(({ expected }) => expected)).toEqual([
      3.048, 3.3528,
    ])
  })

  it('may hold what was observed beside what is forecast; gaps stay', () => {
    const text = `time,observed,forecast
2031-03-03T20:00Z,2.22,
2031-03-03T21:00Z,,
2031-03-03T22:00Z,2.34,2.34
2031-03-03T23:00Z,,
2031-03-04T00:00Z,,2.54
`
    const { readings, observed } = read(text)
    expect(observed.map(({ level }) => level)).toEqual([2.22, null, 2.34])
    expect(readings.map(({ expected }) => expected)).toEqual([2.34, null, 2.54])
    expect(readingsWarnings({ readings, observed }).map(({ kind }) => kind)).toEqual([
      'gap',
      'rising',
    ])
  })

  it('asks for the offset of times that carry none', () => {
    const text = 'time,level\n2031-03-03 22:00,2.34\n2031-03-03 23:00,2.43\n'
    expect(read(text).faults[0]).toMatchObject({ kind: 'no-offset', line: 2, column: 0 })
    expect(read(text, { zone: 'UTC' }).readings[0]!.time).toBe(at(22))
    expect(read(text, { zone: 'Europe/Berlin' }).readings[0]!.time).toBe(at(21))
    expect(read(text, { zone: '-05:00' }).readings[0]!.time).toBe(at(27))
  })

  it.each([
    ['a moment twice', PLAIN.replace('T23:', 'T22:'), 'moment-twice', 3, 0],
    ['a moment backwards', PLAIN.replace('T23:', 'T21:'), 'backwards', 3, 0],
    ['what is no time', PLAIN.replace('2031-03-03T23:00:00Z', 'soon'), 'no-time', 3, 0],
    ['a day that there is not', PLAIN.replace('2031-03-04', '2031-02-30'), 'no-time', 4, 0],
    ['what is no number', PLAIN.replace('2.43', 'high'), 'text', 3, 1],
    ['the other decimal sign', PLAIN.replace('2.43', '"2,43"'), 'decimal', 3, 1],
    ['a formula', PLAIN.replace('2.43', '=A1+1'), 'formula', 3, 1],
    ['a level that is none', PLAIN.replace('2.43', '-999'), 'range', 3, 1],
    ['a low level above the expected', PLAIN.replace('2.31', '2.5'), 'band', 3, 2],
    ['a high level below it', PLAIN.replace('2.55', '2.4'), 'band', 3, 3],
  ])('refuses %s by line and column', (_what, text, kind, line, column) => {
    const found = read(text, { decimal: '.' })
    expect(found.faults).toContainEqual(expect.objectContaining({ kind, line, column }))
    expect(found.readings).toEqual([])
  })

  it.each([
    ['no rows', 'time,level\n', 'no-rows'],
    ['one column', 'time\n2031-03-03T22:00Z\n', 'one-column'],
    ['no level', 'time,low\n2031-03-03T22:00Z,2\n', 'no-level-column'],
    ['no time', 'level,low\n2,1\n', 'no-time-column'],
    ['nothing but gaps', 'time,level\n2031-03-03T22:00Z,\n', 'no-level'],
    ['a mark that is never closed', 'time,level\n"2031-03-03T22:00Z,2\n', 'quotes'],
  ])('refuses a file with %s', (_what, text, kind) => {
    expect(read(text).faults.map((fault) => fault.kind)).toContain(kind)
  })
})

describe('a time of a file', () => {
  const how = { zone: 'Europe/Berlin', dateOrder: 'dmy' } as const

  it('may be written in the ways that files have', () => {
    const noon = Date.UTC(2031, 2, 4, 11)
    for (const text of ['2031-03-04T12:00', '04.03.2031 12:00', '4/3/2031 12:00:00']) {
      expect(readMoment(text, how)).toBe(noon)
    }
    expect(readMoment('3/4/2031 12:00', { ...how, dateOrder: 'mdy' })).toBe(noon)
    expect(readMoment('2031-03-04T12:00+0100', how)).toBe(noon)
    expect(hasOffset('2031-03-04T12:00+0100')).toBe(true)
    expect([isUnclearDate('3/4/2031 12:00'), isUnclearDate('3.4.2031 12:00')]).toEqual([
      true,
      false,
    ])
  })

  it('is refused in the hour that the clock leaves out, and in the one that is there twice', () => {
    expect(readMoment('2031-03-30 02:30', how)).toBe('skipped')
    expect(readMoment('2031-10-26 02:30', how)).toBe('twice')
    expect(readMoment('2031-10-26 02:30+01:00', how)).toBe(Date.UTC(2031, 9, 26, 1, 30))
  })
})
