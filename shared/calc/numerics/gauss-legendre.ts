/** One point of a quadrature rule on 0…1. */
export interface QuadraturePoint {
  readonly at: number
  readonly weight: number
}

/**
 * Gauss–Legendre rule on the interval 0…1, exact for polynomials up to degree 2n − 1.
 *
 * The nodes are the roots of the Legendre polynomial, by Newton from their cosine estimate.
 *
 * @see Abramowitz & Stegun, Handbook of Mathematical Functions, 25.4.29.
 */
export function gaussLegendre(points: number): readonly QuadraturePoint[] {
  return Array.from({ length: points }, (_, i) => {
    let x = Math.cos((Math.PI * (i + 0.75)) / (points + 0.5))
    let slope = 1
    for (let step = 0; step < 10; step += 1) {
      const legendre = legendreAt(points, x)
      slope = legendre.slope
      x -= legendre.value / slope
    }
    return { at: (1 + x) / 2, weight: 1 / ((1 - x ** 2) * slope ** 2) }
  })
}

function legendreAt(degree: number, x: number): { value: number; slope: number } {
  let previous = 1
  let value = x
  for (let n = 2; n <= degree; n += 1) {
    const next = ((2 * n - 1) * x * value - (n - 1) * previous) / n
    previous = value
    value = next
  }
  return { value, slope: (degree * (x * value - previous)) / (x ** 2 - 1) }
}
