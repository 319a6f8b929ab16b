import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  formatNumber,
  formatQuantity,
  fromDisplay,
  toDisplay,
  UNIT_SYSTEMS,
  type QuantityKind,
} from '../../shared/units'

const KINDS: readonly QuantityKind[] = [
  'length',
  'pressure',
  'temperature',
  'flowPerLength',
  'rate',
]

describe('units', () => {
  it('convert exactly as defined', () => {
    // NIST Special Publication 811, appendix B: exact or to the digits given there.
    expect(fromDisplay(1, 'length', 'us')).toBe(0.3048)
    expect(fromDisplay(1, 'pressure', 'us')).toBeCloseTo(47.880_26, 5)
    expect(fromDisplay(1, 'forcePerLength', 'us')).toBeCloseTo(14.5939, 4)
    expect(fromDisplay(1, 'massPerLength', 'us')).toBeCloseTo(1.488_164, 6)
    expect(fromDisplay(1, 'density', 'us')).toBeCloseTo(16.018_46, 5)
    expect(fromDisplay(212, 'temperature', 'us')).toBeCloseTo(100, 12)
  })

  it('come back from a round trip', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...KINDS),
        fc.constantFrom(...UNIT_SYSTEMS),
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        (kind, system, value) => {
          const back = fromDisplay(toDisplay(value, kind, system), kind, system)
          expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)))
        },
      ),
    )
  })
})

describe('formatting', () => {
  it('rounds limits down and never up', () => {
    expect(formatQuantity({ value: 0.4899, kind: 'length', rounding: 'down' }, 'metric')).toBe(
      '0.489\u00a0m',
    )
    expect(formatNumber(0.59, 3, 'down')).toBe('0.590')
    expect(formatNumber(-0.0501, 3, 'down')).toBe('−0.051')
    expect(formatNumber(0.1231, 3, 'up')).toBe('0.124')
  })

  it('writes a minus sign, but never on zero', () => {
    expect(formatNumber(-1.5, 1)).toBe('−1.5')
    expect(formatNumber(-0.0001, 3)).toBe('0.000')
  })

  it('knows percent, ratios and bare figures', () => {
    expect(formatQuantity({ value: 0.976, kind: 'percent' }, 'metric')).toBe('98\u202f%')
    expect(formatQuantity({ value: 1.3314, kind: 'ratio' }, 'us')).toBe('1.33')
    expect(formatQuantity({ value: 15_000, kind: 'pressure', isBare: true }, 'metric')).toBe('15.0')
  })
})
