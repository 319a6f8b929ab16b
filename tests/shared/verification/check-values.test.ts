import { describe, expect, it } from 'vitest'
import { agrees, printedTolerance } from '../../../shared/verification/check-row'
import { CHECK_ROWS, REFERENCE_ROWS } from '../../../shared/verification'

// Source and tag of each value stand beside it in shared/verification/.
describe.each(CHECK_ROWS.map((row) => [row.topic, row.tag, row.title, row] as const))(
  '%s, %s: %s',
  (_topic, _tag, _title, row) => {
    it(`agrees with ${row.source}`, () => {
      for (const figure of row.figures) {
        const computed = figure.compute()
        expect(
          agrees(figure),
          `${figure.label}: computed ${computed}, printed ${figure.printed} ${figure.unit}`,
        ).toBe(true)
      }
    })
  },
)

describe('agreement with a printed figure', () => {
  const figure = { label: 'x', unit: 'm', printed: '0.4896', compute: () => 0.48964 }

  it('allows half of the last printed digit', () => {
    expect(printedTolerance('0.4896')).toBeCloseTo(0.00005, 12)
    expect(printedTolerance('800')).toBe(0.5)
    expect(agrees(figure)).toBe(true)
  })

  it('refuses the next digit', () => {
    expect(agrees({ ...figure, compute: () => 0.48966 })).toBe(false)
    expect(agrees({ ...figure, compute: () => Number.NaN })).toBe(false)
  })
})

it('counts reference rows apart, each with its reason', () => {
  const computed = new Set(CHECK_ROWS.map(({ id }) => id))
  expect(computed.size).toBe(CHECK_ROWS.length)
  for (const row of REFERENCE_ROWS) {
    expect(computed.has(row.id)).toBe(false)
    expect(row.why.length).toBeGreaterThan(10)
  }
})
