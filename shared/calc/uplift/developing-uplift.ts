import { erfc } from '../numerics/erfc'

/** Below this τ the sine series converges slowly and the solution for a half-space is exact to 1e-10. */
const EARLY_TAU = 0.01

/** Drops terms of the series below 1e-18 of the first. */
const NEGLIGIBLE = 41

/** Σ over n (all, or odd only) of weight(n) · e^(−n²π²τ). */
function decaySum(tau: number, step: 1 | 2, weight: (n: number) => number): number {
  let sum = 0
  for (let n = 1; n ** 2 * Math.PI ** 2 * tau < NEGLIGIBLE; n += step) {
    sum += weight(n) * Math.exp(-(n ** 2) * Math.PI ** 2 * tau)
  }
  return sum
}

/**
 * Mean share of the edge pressure under the base when the pressure has been growing for
 * τ = c t / B²:
 *
 *     r = ½ − Σ_odd 4/(n²π²) e^(−n²π²τ)     below τ 0.01: 2 √(τ/π)
 *
 * One-dimensional diffusion, pressure held at the wet edge (a step at t = 0), zero at the dry toe.
 *
 * @see Carslaw & Jaeger, Conduction of Heat in Solids, 3.4, for the series; integrated here.
 */
export function developingMean(tau: number): number {
  if (tau < EARLY_TAU) return 2 * Math.sqrt(tau / Math.PI)
  return 0.5 - decaySum(tau, 2, (n) => 4 / (n * Math.PI) ** 2)
}

/**
 * First moment of the share about the dry toe, in units of B²:
 *
 *     m = ⅓ − Σ_all 2/(n²π²) e^(−n²π²τ)     below τ 0.01: 2 √(τ/π) − τ
 */
export function developingMoment(tau: number): number {
  if (tau < EARLY_TAU) return 2 * Math.sqrt(tau / Math.PI) - tau
  return 1 / 3 - decaySum(tau, 1, (n) => 2 / (n * Math.PI) ** 2)
}

/**
 * Share of the edge pressure at the fraction ξ = X/B from the wet edge:
 *
 *     1 − ξ − Σ_all 2/(nπ) sin(nπξ) e^(−n²π²τ)     below τ 0.01: erfc(ξ / 2√τ)
 */
export function developingShare(tau: number, xi: number): number {
  if (tau < EARLY_TAU) return tau === 0 ? 0 : erfc(xi / (2 * Math.sqrt(tau)))
  return 1 - xi - decaySum(tau, 1, (n) => (2 / (n * Math.PI)) * Math.sin(n * Math.PI * xi))
}

/** Integral of that share over ξ from 0 to `to`, in closed form. */
export function developingPartial(tau: number, to: number): number {
  if (tau === 0) return 0
  if (tau < EARLY_TAU) {
    const scale = 2 * Math.sqrt(tau)
    const z = to / scale
    return scale * (z * erfc(z) + (1 - Math.exp(-(z ** 2))) / Math.sqrt(Math.PI))
  }
  const series = decaySum(
    tau,
    1,
    (n) => (2 / (n * Math.PI) ** 2) * (1 - Math.cos(n * Math.PI * to)),
  )
  return to - to ** 2 / 2 - series
}
