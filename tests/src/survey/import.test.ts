import { describe, expect, it } from 'vitest'
import { LOW_ROAD_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { LOW_ROAD_SCENARIOS } from '../../../server/demo/ferry-quay-scenarios'
import { bestLayout } from '../../../shared/checks/layout/best-layout'
import { decodeText, MOST_BYTES } from '@/survey/decode-text'
import { matchColumns } from '@/survey/match-columns'
import { decimalOf, readStations, type ReadingChoice } from '@/survey/read-stations'
import { delimiterOf, readTable } from '@/survey/read-table'
import { TUBES } from '../../support/tubes'
import { FERRY_QUAY_CSV } from './ferry-quay-survey'

function read(text: string, changes: Partial<ReadingChoice> = {}) {
  const table = readTable(text)
  const { hasHeading, match } = matchColumns(table)
  const choice = {
    hasHeading,
    match,
    decimal: decimalOf(table),
    unit: 'm' as const,
    surface: 'turf',
  }
  return readStations(table, { ...choice, ...changes }, 10)
}

const bytes = (text: string) => new TextEncoder().encode(text)

function utf16(text: string, isLittle: boolean, hasMark: boolean): Uint8Array {
  const marked = hasMark ? `\ufeff${text}` : text
  const view = new DataView(new ArrayBuffer(marked.length * 2))
  for (let i = 0; i < marked.length; i += 1) view.setUint16(2 * i, marked.charCodeAt(i), isLittle)
  return new Uint8Array(view.buffer)
}

describe('the survey of Ferry Quay', () => {
  const { stations, faults, warnings } = read(FERRY_QUAY_CSV)

  it('is read as it was surveyed', () => {
    expect(faults).toEqual([])
    expect(warnings).toEqual([])
    const figures = (rows: typeof stations) => rows.map(({ note: _, ...row }) => row)
    expect(figures(stations)).toEqual(figures([...LOW_ROAD_STATIONS]))
    expect(stations[4]!.note).toBe('turn 20° right; slipway head')
  })

  // Sizes of an independent program for the same survey, level and rules.
  it('gives the layout of the demonstration', () => {
    const swung = stations.map((row) =>
      row.surface === 'loose-gravel' ? { ...row, groundLevel: 2.97, surface: 'asphalt' } : row,
    )
    const layout = bestLayout(
      { stations: swung, sectionLength: 10 },
      LOW_ROAD_SCENARIOS[0]!.content,
      TUBES,
    )
    const count = (size: number) => layout.sections.filter(({ best }) => best === size).length
    expect([count(0), count(1), count(2)]).toEqual([4, 9, 5])
  })
})

describe('a file', () => {
  it.each([
    ['UTF-8', bytes(FERRY_QUAY_CSV), 'utf-8'],
    ['UTF-8 with a byte order mark', bytes(`\ufeff${FERRY_QUAY_CSV}`), 'utf-8'],
    ['UTF-16, little end first', utf16(FERRY_QUAY_CSV, true, true), 'utf-16le'],
    ['UTF-16, big end first', utf16(FERRY_QUAY_CSV, false, true), 'utf-16be'],
    ['UTF-16 without a mark', utf16(FERRY_QUAY_CSV, true, false), 'utf-16le'],
    ['UTF-16, big end, without a mark', utf16(FERRY_QUAY_CSV, false, false), 'utf-16be'],
  ])('is read in %s', (_what, file, encoding) => {
    const decoded = decodeText(file)
    expect(decoded).toMatchObject({ encoding })
    expect(read((decoded as { text: string }).text).stations).toHaveLength(28)
  })

  it('in a Western European encoding of Windows is read with its signs', () => {
    const file = Uint8Array.from([...'ch;z;note\n0;3;20'].map((sign) => sign.charCodeAt(0)))
    expect(decodeText(Uint8Array.from([...file, 0xb0]))).toEqual({
      text: 'ch;z;note\n0;3;20°',
      encoding: 'windows-1252',
    })
  })

  it.each([
    ['empty', new Uint8Array(), 'empty'],
    ['blank', bytes('  \n \n'), 'empty'],
    ['larger than any survey', new Uint8Array(50_000_000), 'too-large'],
    ['a byte more than allowed', new Uint8Array(MOST_BYTES + 1), 'too-large'],
    ['a PDF file', bytes('%PDF-1.7 …'), 'pdf'],
    ['a workbook', Uint8Array.from([0x50, 0x4b, 3, 4, 20, 0]), 'spreadsheet'],
    ['a program', Uint8Array.from([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 0, 0, 1, 2, 3]), 'binary'],
  ])('that is %s is refused as such', (_what, file, fault) => {
    expect(decodeText(file)).toBe(fault)
  })
})

describe('a table', () => {
  const ROWS = [
    ['ch', 'z'],
    ['0', '3.16'],
    ['10', '3.13'],
  ]
  it.each([',', ';', '\t', '|'])('is parted by %j', (delimiter) => {
    const text = ROWS.map((row) => row.join(delimiter)).join('\r\n')
    expect(delimiterOf(text)).toBe(delimiter)
    expect(read(text).stations.map(({ groundLevel }) => groundLevel)).toEqual([3.16, 3.13])
  })

  it('without a heading is taken in the usual order', () => {
    const { stations } = read('0,3.16,turf\n10,3.13,asphalt\n')
    expect(stations).toMatchObject([
      { chainage: 0, groundLevel: 3.16, surface: 'turf' },
      { chainage: 10, surface: 'asphalt' },
    ])
  })

  it('without chainages adds up the distances', () => {
    const { stations } = read('x;y;z\n0;0;3\n3;4;3\n3;10;3\n')
    expect(stations.map(({ chainage }) => chainage)).toEqual([0, 5, 11])
  })

  it('in feet becomes metres, exactly', () => {
    const { stations } = read('ch,z\n0,10\n32.808399,10\n', { unit: 'ft' })
    expect(stations.map(({ chainage }) => chainage)).toEqual([0, 10])
    expect(stations[0]!.groundLevel).toBe(3.048)
  })

  it('keeps its own files whole, with what a spreadsheet would run', () => {
    const { stations } = read(`ch,z,note\n0,3,"'=HYPERLINK(""x"")"\n10,3,'quoted'\n`)
    expect(stations.map(({ note }) => note)).toEqual(['=HYPERLINK("x")', "'quoted'"])
  })
})

describe('faults by line and column', () => {
  const faultsOf = (text: string, changes: Partial<ReadingChoice> = {}) =>
    read(text, changes).faults.map(({ kind, line, column }) => [kind, line, column])

  it.each([
    ['a word', 'ch;z\n0;3\n10;abc\n', ['text', 3, 1]],
    ['nothing', 'ch;z\n0;3\n10;\n', ['empty', 3, 1]],
    ['a formula', 'ch;z\n0;3\n10;=A1+1\n', ['formula', 3, 1]],
    ['an error of a spreadsheet', 'ch;z\n0;3\n10;#REF!\n', ['formula', 3, 1]],
    ['another decimal sign', 'ch;z\n0;3,1\n10;3,2\n20;3.3\n', ['decimal', 4, 1]],
    ['a thousands sign', 'ch;z\n0;3,1\n10;1.234,5\n', ['thousands', 3, 1]],
    ['the same chainage twice', 'ch;z\n0;3\n10;3\n10;3\n', ['range', 4, 0]],
    ['a ground in millimetres', 'ch;z\n0;3160000\n', ['range', 2, 1]],
    ['half a place', 'ch;x;z\n0;1;3\n', ['half-place', null, null]],
    ['no ground', 'ch;surface\n0;turf\n', ['no-ground', null, null]],
    ['a heading alone', 'ch;z\n', ['no-rows', null, null]],
  ])('name %s', (_what, text, fault) => {
    expect(faultsOf(text)).toEqual([fault])
    expect(read(text).stations).toEqual([])
  })

  it('count lines as an editor does, over empty lines and breaks inside a cell', () => {
    expect(faultsOf('ch;z;note\n\n0;3;"two\nlines"\n10;x;\n')).toEqual([['text', 5, 1]])
  })

  it('name the wrong delimiter and a quotation mark that stays open', () => {
    const table = readTable('ch,z\n0,3\n', ';')
    const { faults } = readStations(
      table,
      { ...matchColumns(table), decimal: '.', unit: 'm', surface: 'turf' },
      10,
    )
    expect(faults).toMatchObject([{ kind: 'one-column', cell: ';' }])
    expect(faultsOf('ch;z;note\n0;3;"open\n10;3;\n')[0]![0]).toBe('quotes')
  })

  it('refuse more stations than a line may have', () => {
    const rows = Array.from({ length: 5001 }, (_, i) => `${i};3`).join('\n')
    expect(faultsOf(`ch;z\n${rows}`)).toEqual([['too-many', null, null]])
  })
})

it('warns by line of a distance that is off', () => {
  const { warnings } = read('ch;x;y;z\n0;0;0;3\n10;10,08;0;3\n')
  expect(warnings).toMatchObject([{ line: 3 }])
  expect(read('ch;x;y;z\n0;0;0;3\n10;10,04;0;3\n').warnings).toEqual([])
})
