import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { canonicalJson } from '../../../shared/sheet/canonical-json'
import {
  CODE_LENGTH,
  CODE_SIGNS,
  codeFrom,
  readCode,
} from '../../../shared/sheet/verification-code'

describe('canonical JSON', () => {
  it('is that of the standard', () => {
    // RFC 8785, 3.2.2 and 3.2.3: the sample object and its canonical form.
    const sample = {
      numbers: JSON.parse(
        '[333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001]',
      ) as unknown,
      string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\"\u002f',
      literals: [null, true, false],
    }
    expect(canonicalJson(sample)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
        '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    )
  })

  it('does not depend on the order in which fields were written', () => {
    const a = canonicalJson({ b: 1, a: [{ d: 2, c: 3 }] })
    expect(a).toBe(canonicalJson({ a: [{ c: 3, d: 2 }], b: 1 }))
    const hash = (text: string) => createHash('sha256').update(text).digest('hex')
    expect(hash(a)).not.toBe(hash(a.replace('3', '4')))
  })

  it.each([Number.NaN, Number.POSITIVE_INFINITY])('refuses %s', (value) => {
    expect(() => canonicalJson({ value })).toThrow(TypeError)
  })
})

describe('a verification code', () => {
  it('has 60 bits, in three groups of four', () => {
    expect(Math.log2(CODE_SIGNS.length) * CODE_LENGTH).toBe(60)
    const code = codeFrom(Uint8Array.from({ length: 12 }, (_, i) => i * 21))
    expect(code).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}(?:-[0-9A-HJKMNP-TV-Z]{4}){2}$/)
    expect(new Set(CODE_SIGNS).size).toBe(32)
  })

  it.each([
    ['7q4k 19xm 3trp', '7Q4K-19XM-3TRP'],
    ['7Q4K–l9XM–3TRP', '7Q4K-19XM-3TRP'],
    ['oooo-iiii-llll', '0000-1111-1111'],
  ])('is read from %s', (typed, code) => {
    expect(readCode(typed)).toBe(code)
  })

  it.each(['', '7Q4K-19XM', '7Q4K-19XM-3TRU', '7Q4K-19XM-3TRP-1'])(
    'is not read from "%s"',
    (text) => {
      expect(readCode(text)).toBeNull()
    },
  )
})
