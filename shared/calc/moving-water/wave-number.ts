/**
 * Wave number k [rad/m] of linear waves of period T on water of depth h:
 *
 *     (2π/T)² = g k tanh(k h)
 *
 * Newton on x = k h from Eckart's estimate; a handful of steps reach the last digit.
 *
 * @remarks Valid for depth > 0 and period > 0.
 */
export function waveNumber(period: number, depth: number, gravity: number): number {
  const target = ((2 * Math.PI) / period) ** 2 * (depth / gravity)
  let x = target / Math.sqrt(Math.tanh(target))
  for (let step = 0; step < 20; step += 1) {
    const tanh = Math.tanh(x)
    const change = (x * tanh - target) / (tanh + x * (1 - tanh ** 2))
    x -= change
    if (Math.abs(change) <= 1e-15 * x) break
  }
  return x / depth
}
