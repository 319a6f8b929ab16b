import { expect } from 'vitest'

/** Asserts relative closeness; where the expected value is zero, the same bound is absolute. */
export function expectClose(actual: number, expected: number, bound: number, label = ''): void {
  const allowed = bound * (expected === 0 ? 1 : Math.abs(expected))
  expect(
    Math.abs(actual - expected),
    `${label}: ${actual} against ${expected}, allowed ${allowed}`,
  ).toBeLessThanOrEqual(allowed)
}

/** Asserts that a value agrees with a printed one to the last digit that was printed. */
export function expectPrinted(actual: number, printed: number, label = ''): void {
  const [mantissa, exponent = '0'] = String(printed).toLowerCase().split('e')
  const decimals = (mantissa!.split('.')[1] ?? '').length - Number(exponent)
  // Half a last digit, and what the printed value itself cannot hold in binary.
  const allowed = 0.5 * 10 ** -decimals + 4e-16 * Math.abs(printed)
  expect(
    Math.abs(actual - printed),
    `${label}: ${actual} against ${printed}, printed to ${decimals} decimals`,
  ).toBeLessThanOrEqual(allowed * 1.001)
}
