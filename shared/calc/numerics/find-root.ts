/** An interval whose ends give values of opposite sign. */
export interface Bracket {
  readonly low: number
  readonly high: number
  readonly atLow: number
  readonly atHigh: number
}

/** More than enough: bisection alone needs 52 halvings of a double. */
const MAX_STEPS = 80

/**
 * Root of a continuous function inside a bracket, by Chandrupatla's method: inverse quadratic
 * interpolation where it is safe, bisection where it is not. It cannot leave the bracket and always
 * ends.
 *
 * @param tolerance Half the width, relative to the root, at which the search ends.
 * @see Chandrupatla, Advances in Engineering Software 28 (1997) 145–149.
 */
export function findRoot(f: (x: number) => number, bracket: Bracket, tolerance = 1e-15): number {
  let { low: a, high: b, atLow: fa, atHigh: fb } = bracket
  let c = a
  let fc = fa
  let t = 0.5
  for (let step = 0; step < MAX_STEPS; step += 1) {
    const x = a + t * (b - a)
    const fx = f(x)
    if (Math.sign(fx) === Math.sign(fa)) {
      c = a
      fc = fa
    } else {
      c = b
      b = a
      fc = fb
      fb = fa
    }
    a = x
    fa = fx
    const best = Math.abs(fa) < Math.abs(fb) ? a : b
    if (fa === 0 || fb === 0 || a === b) return best
    const limit = (tolerance * Math.abs(best)) / Math.abs(b - a)
    if (limit > 0.5) return best
    t = Math.min(1 - limit, Math.max(limit, nextFraction({ a, b, c, fa, fb, fc })))
  }
  return Math.abs(fa) < Math.abs(fb) ? a : b
}

interface Points {
  readonly a: number
  readonly b: number
  readonly c: number
  readonly fa: number
  readonly fb: number
  readonly fc: number
}

/** Where to look next between a and b: interpolated if the three points are well spread, else half-way. */
function nextFraction({ a, b, c, fa, fb, fc }: Points): number {
  const xi = (a - b) / (c - b)
  const phi = (fa - fb) / (fc - fb)
  if (!(phi ** 2 < xi && (1 - phi) ** 2 < 1 - xi)) return 0.5
  const fraction =
    (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb))
  // Values too small to divide by leave nothing to interpolate with.
  return Number.isFinite(fraction) ? fraction : 0.5
}
