/** Terms that bring the Taylor series of erf to machine accuracy below the switch at 2. */
const SERIES_TERMS = 60
/** Levels of the continued fraction that do so above it. */
const FRACTION_LEVELS = 60

/**
 * Complementary error function for x ≥ 0: Taylor series below 2, continued fraction above.
 *
 * @see Abramowitz & Stegun, Handbook of Mathematical Functions, 7.1.6 and 7.1.14.
 */
export function erfc(x: number): number {
  if (x > 27) return 0
  return x < 2 ? 1 - erfSeries(x) : erfcFraction(x)
}

function erfSeries(x: number): number {
  let term = x
  let sum = x
  for (let n = 1; n < SERIES_TERMS; n += 1) {
    term *= (2 * x ** 2) / (2 * n + 1)
    sum += term
  }
  return (2 / Math.sqrt(Math.PI)) * Math.exp(-(x ** 2)) * sum
}

function erfcFraction(x: number): number {
  let tail = x
  for (let level = FRACTION_LEVELS; level >= 1; level -= 1) tail = x + level / 2 / tail
  return Math.exp(-(x ** 2)) / (Math.sqrt(Math.PI) * tail)
}
