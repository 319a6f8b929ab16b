import { describe, expect, it } from 'vitest'
import { LOW_ROAD_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { columnsOf, readPasted, rowsOfPasted } from '../../../src/line/pasted-rows'
import {
  cellOfPath,
  cellProblems,
  cellText,
  emptyRow,
  rowsOf,
  stationsOf,
  withCell,
} from '../../../src/line/station-rows'
import { tableForReport } from '../../../src/line/table-copy'

const options = { units: 'metric' as const, firstKey: 0, surface: 'turf' }
const pasted = (text: string) => rowsOfPasted(readPasted(text), options)

describe('rows from a spreadsheet', () => {
  it.each([
    ['tabs and decimal commas', '0\t2,90\tturf\n10\t2,80\tturf'],
    ['semicolons and decimal commas', '0;2,90;turf\r\n10;2,80;turf\r\n'],
    ['commas and decimal points', '0,2.90,turf\n10,2.80,turf'],
    ['a heading in another order', 'Surface;Ground (m);Chainage [m]\nturf;2,90;0\nturf;2,80;10'],
  ])('are read with %s', (_name, text) => {
    expect(cellProblems(pasted(text))).toEqual([])
    expect(stationsOf(pasted(text))).toMatchObject([
      { chainage: 0, groundLevel: 2.9, surface: 'turf' },
      { chainage: 10, groundLevel: 2.8, surface: 'turf' },
    ])
  })

  it('are read whole, with notes in quotation marks and surfaces by their name', () => {
    const text = '45\t44.70\t−1.71\t2.79\tLoose gravel\t8.0\t"lowest ""ground"", wet"'
    expect(stationsOf(pasted(text))).toEqual([
      {
        chainage: 45,
        x: 44.7,
        y: -1.71,
        groundLevel: 2.79,
        surface: 'loose-gravel',
        clearWidth: 8,
        note: 'lowest "ground", wet',
      },
    ])
  })

  it('leave out columns that no heading names', () => {
    const table = readPasted('ch\tcolour\tground\n0\tgreen\t2.9')
    expect(columnsOf(table)).toEqual(['chainage', null, 'groundLevel'])
    expect(stationsOf(rowsOfPasted(table, options))).toMatchObject([{ groundLevel: 2.9 }])
  })

  it('keep what cannot be read in its cell', () => {
    const rows = pasted('0\t2.9\n10\tlow')
    expect(cellText(rows[1]!, 'groundLevel', 'metric')).toBe('low')
    expect(cellProblems(rows)).toEqual([{ row: 1, column: 'groundLevel', reason: 'text' }])
  })
})

describe('rows of a survey', () => {
  it('give back the stations that they were made of', () => {
    expect(stationsOf(rowsOf(LOW_ROAD_STATIONS))).toEqual(LOW_ROAD_STATIONS)
  })

  it('are typed in the units that are shown', () => {
    const row = withCell(emptyRow(0, 'turf'), 'groundLevel', '10', 'us')
    expect(row.numbers.groundLevel.value).toBeCloseTo(3.048, 12)
  })

  it('name what is missing, and leave x, y, clear width and note alone', () => {
    expect(cellProblems([emptyRow(0, '')])).toEqual([
      { row: 0, column: 'chainage', reason: 'empty' },
      { row: 0, column: 'groundLevel', reason: 'empty' },
      { row: 0, column: 'surface', reason: 'empty' },
    ])
  })

  it('find the cell that the server names', () => {
    expect(cellOfPath('stations[3].groundLevel')).toEqual({ row: 3, column: 'groundLevel' })
    expect(cellOfPath('sectionLength')).toBeNull()
  })
})

it('a copied table is a table for a report and a text with tabs', () => {
  const { html, text } = tableForReport(['Name', 'Level'], [['<b>A & B</b>', '3.42\u00a0m\tQD']])
  expect(html).toContain('<td>&lt;b&gt;A &amp; B&lt;/b&gt;</td>')
  expect(text).toBe('Name\tLevel\n<b>A & B</b>\t3.42 m QD')
})
