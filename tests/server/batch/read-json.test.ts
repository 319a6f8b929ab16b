import { describe, expect, it } from 'vitest'
import { readJson } from '../../../server/batch/read-json'
import { InvalidJsonError } from '../../../server/errors'

describe('readJson', () => {
  it('reads JSON, with or without a byte order mark', () => {
    const text = '{"a": [1, "NaN", "\\"Infinity\\""], "b": -1.5e-3}'
    expect(readJson(text)).toEqual({ a: [1, 'NaN', '"Infinity"'], b: -1.5e-3 })
    expect(readJson(`\uFEFF${text}`)).toEqual(readJson(text))
  })

  it('reads the words that JSON lacks as numbers, so that a schema can name the field', () => {
    const text = '{"a": NaN, "b": Infinity, "c": [-Infinity], "d": "NaN", "e \\" NaN": 1}'
    const d = { a: NaN, b: Infinity, c: [-Infinity], d: 'NaN', 'e " NaN': 1 }
    expect(readJson(text)).toEqual(d)
  })

  it('reads a number that is too large as Infinity', () => {
    expect(readJson('[1e309, -1e309]')).toEqual([Infinity, -Infinity])
  })

  it.each([
    ['nothing', ''],
    ['only space', ' \n'],
    ['a missing bracket', '{"a": 1'],
    ['a decimal comma', '{"a": 0,42}'],
    ['a trailing comma', '[1,]'],
    ['single quotes', "{'a': 1}"],
    ['a word of another language', '{"a": nan}'],
    ['two texts', '{} {}'],
  ])('refuses %s', (_what, text) => {
    expect(() => readJson(text)).toThrow(InvalidJsonError)
  })

  it('says in one line what is wrong, also where the text has line breaks', () => {
    const read = () => readJson('{\n"depth":\n\n0.42\n"mass"')
    expect(read).toThrow(InvalidJsonError)
    expect(read).not.toThrow(/\n/)
  })
})
