import { describe, expect, it } from 'vitest'
import { type CsvCell, toCsv } from '../../../server/http/csv'

const cell = (value: CsvCell) => toCsv([[value]]).slice(1, -2)

describe('CSV', () => {
  it('has commas, CRLF and a mark that says UTF-8', () => {
    expect(
      toCsv([
        ['a', 'b'],
        [1, null],
      ]),
    ).toBe('\uFEFFa,b\r\n1,\r\n')
  })

  it.each([
    ['a "quoted" name', '"a ""quoted"" name"'],
    ['one, two', '"one, two"'],
    ['first\nsecond', '"first\nsecond"'],
    ['Low road', 'Low road'],
  ])('writes %j as %j', (value, written) => {
    expect(cell(value)).toBe(written)
  })

  it.each(['=1+1', '+1', '-1', '@now', '\t=1', '\r=1', '\n=1', ' =1', '\u00a0=1', '＝1', '＠now'])(
    'disarms the formula %j',
    (value) => {
      expect(cell(value)).toMatch(/^"?'/)
    },
  )

  it.each([
    [-0.04, '-0.04'],
    [3.42, '3.42'],
    [true, 'true'],
    [undefined, ''],
  ])('leaves %s as it is, for it is no text', (value, written) => {
    expect(cell(value)).toBe(written)
  })

  it.each(['a=b', '1-2', 'engineer@people.test'])('leaves the text %j alone', (value) => {
    expect(cell(value)).toBe(value)
  })
})
