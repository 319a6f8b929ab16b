import type { Membrane } from './membrane'

/** Newton needs 3 to 6 steps; halving the bracket to the last digit would need 60. */
const MAX_STEPS = 100

interface Balance {
  readonly value: number
  readonly slope: number
  /** Size of the terms that cancel, to judge the value by. */
  readonly scale: number
}

/**
 * Vertical balance of the weld line, T sin β − T sin α − T_s sin φ = 0, divided by T κ/r:
 *
 *     w² (2 − a − s) / (sin α + sin β) − h² sin φ = 0,   s = y/r,   a = s + κ w²/r
 *
 * In this form nothing cancels, however thin the water.
 */
function weldBalance(membrane: Membrane, radius: number, y: number): Balance {
  const { depth: h, kappa } = membrane
  const w = h - y
  const s = y / radius
  const a = s + (kappa * w ** 2) / radius
  const rest = 1 - y / h
  const sinAlpha = Math.sqrt(s * (2 - s))
  const sinBeta = Math.sqrt(a * (2 - a))
  const sinPhi = Math.sqrt(1 - rest ** 4)

  const sines = sinAlpha + sinBeta
  const pull = (w ** 2 * (2 - a - s)) / sines
  const hold = h ** 2 * sinPhi

  const aSlope = (1 - 2 * kappa * w) / radius
  const sinesSlope = (1 - s) / (radius * sinAlpha) + ((1 - a) * aSlope) / sinBeta
  const pullSlope =
    (-2 * w * (2 - a - s) - w ** 2 * (aSlope + 1 / radius)) / sines - (pull * sinesSlope) / sines
  const holdSlope = (2 * h * rest ** 3) / sinPhi
  return { value: pull - hold, slope: pullSlope - holdSlope, scale: hold }
}

/**
 * Height of the weld line at which skin and skirt balance for a skin of radius r: the one root in
 * (0, h). The balance is positive at the ground and negative at the water surface; Newton steps that
 * would leave the shrinking bracket are replaced by halving it.
 *
 * @param start Where to begin [m], inside (0, h).
 * @remarks Needs r > κ h²/2, so that two tensions can carry the skirt, and r ≥ h/2.
 */
export function weldHeight(membrane: Membrane, radius: number, start: number): number {
  let low = 0
  let high = membrane.depth
  let y = start
  for (let step = 0; step < MAX_STEPS; step += 1) {
    const { value, slope, scale } = weldBalance(membrane, radius, y)
    if (value > 0) low = y
    else high = y
    if (Math.abs(value) <= 4e-16 * scale) return y
    const newton = y - value / slope
    const next = newton > low && newton < high ? newton : (low + high) / 2
    if (Math.abs(next - y) <= 1e-16 * y || next === low || next === high) return next
    y = next
  }
  return y
}
