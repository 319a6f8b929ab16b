/** Water that flows through pervious ground under an impervious base, per metre of line. */
export interface GroundSeepage {
  /** Permeability, k [m/s]. */
  readonly permeability: number
  /** Difference of head between wet and dry side [m], 0 or more. */
  readonly head: number
  /** Width of the base, B [m], above 0. */
  readonly baseWidth: number
  /** Thickness of the pervious layer, T_l [m], above 0. */
  readonly layerThickness: number
}

/** Beyond this x both hyperbolic functions have reached their limits to the last digit. */
const LARGE = 20

/**
 * Seepage under a flat base on a layer of finite thickness, exact for every B/T_l:
 *
 *     q = k h · agm(1, sech x) / (2 agm(1, tanh x)),   x = π B / 4 T_l   [m²/s]
 *
 * For large x, agm(1, sech x) → π / (2 (x + ln 2)).
 *
 * @see Harr, Groundwater and Seepage, 1962, after Pavlovsky: q/(k h) = K′/2K (from memory).
 */
export function groundSeepage(seepage: GroundSeepage): number {
  const { permeability, head, baseWidth, layerThickness } = seepage
  const x = (Math.PI * baseWidth) / (4 * layerThickness)
  const ratio =
    x > LARGE
      ? Math.PI / (4 * (x + Math.LN2))
      : agm(1, 1 / Math.cosh(x)) / (2 * agm(1, Math.tanh(x)))
  return permeability * head * ratio
}

/** Arithmetic–geometric mean of two positive numbers. */
function agm(a: number, b: number): number {
  let [x, y] = [a, b]
  for (let step = 0; step < 40 && Math.abs(x - y) > 1e-16 * x; step += 1) {
    ;[x, y] = [(x + y) / 2, Math.sqrt(x * y)]
  }
  return x
}
