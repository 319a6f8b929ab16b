import { describe, expect, it } from 'vitest'
import { upliftAtTime, type DepthReading } from '../../../shared/calc/uplift/changing-level'
import { developingMean, developingMoment } from '../../../shared/calc/uplift/developing-uplift'
import { OutOfRangeError } from '../../../shared/errors'
import { expectClose, expectPrinted } from '../../support/close-to'

const BASE = { base: 2.32, diffusivity: 1e-5, edgeFactor: 1 }
const DAY = 86_400

/** Implicit finite differences (Crank–Nicolson) for the head under the base: slow and independent. */
function diffuse(depthAt: (time: number) => number, until: number, cells = 800, steps = 4000) {
  const dx = 1 / cells
  const dt = until / steps
  const ratio = (BASE.diffusivity / BASE.base ** 2) * (dt / dx ** 2)
  let head = new Float64Array(cells + 1)
  for (let step = 1; step <= steps; step += 1) {
    const next = new Float64Array(cells + 1)
    next[0] = depthAt(step * dt)
    // Thomas algorithm on (1 + r) u_i − r/2 (u_{i−1} + u_{i+1}) = explicit half.
    const c = new Float64Array(cells)
    const d = new Float64Array(cells)
    for (let i = 1; i < cells; i += 1) {
      const explicit =
        (1 - ratio) * head[i]! +
        (ratio / 2) * (head[i - 1]! + head[i + 1]!) +
        (i === 1 ? (ratio / 2) * next[0] : 0)
      const pivot = 1 + ratio + (i > 1 ? (ratio / 2) * c[i - 1]! : 0)
      c[i] = -ratio / 2 / pivot
      d[i] = (explicit + (i > 1 ? (ratio / 2) * d[i - 1]! : 0)) / pivot
    }
    for (let i = cells - 1; i >= 1; i -= 1) next[i] = d[i]! - c[i]! * next[i + 1]!
    head = next
  }
  let [force, moment] = [0, 0]
  const depth = depthAt(until)
  for (let i = 0; i <= cells; i += 1) {
    const weight = (i === 0 || i === cells ? 0.5 : 1) * dx * Math.min(head[i]!, depth)
    force += weight
    moment += weight * (1 - i * dx)
  }
  return { force: BASE.base * force, moment: BASE.base ** 2 * moment }
}

function depthOf(readings: readonly DepthReading[]): (time: number) => number {
  return (time) => {
    const i = readings.findIndex(({ time: at }) => at >= time)
    const [a, b] = [readings[Math.max(0, i - 1)]!, readings[Math.max(0, i)]!]
    if (a === b) return a.depth
    return a.depth + ((b.depth - a.depth) * (time - a.time)) / (b.time - a.time)
  }
}

describe('water under the skirt while the level changes', () => {
  it('is that of a step where the level jumps and stays', () => {
    const { force, moment } = upliftAtTime(
      [
        { time: 0, depth: 0.55 },
        { time: DAY, depth: 0.55 },
      ],
      BASE,
      DAY,
    )
    const tau = (1e-5 * DAY) / 2.32 ** 2
    expectClose(force, 0.55 * 2.32 * developingMean(tau), 1e-12)
    expectClose(moment, 0.55 * 2.32 ** 2 * developingMoment(tau), 1e-12)
  })

  it('lags behind a ramp', () => {
    // Derived, two routes: level rising linearly to h in the whole time, U/(ρ g h B) at τ 0.16052.
    const { force } = upliftAtTime(
      [
        { time: 0, depth: 0 },
        { time: DAY, depth: 0.55 },
      ],
      BASE,
      DAY,
    )
    expectPrinted(force / (0.55 * 2.32), 0.292897119)
  })

  it('vents where the level drops at once', () => {
    // Derived, sine series and quadrature: 0.55 m for 24 h, then 0.30 m; uncapped 5218.31571 N/m.
    const { force, isVented } = upliftAtTime(
      [
        { time: 0, depth: 0.55 },
        { time: DAY, depth: 0.55 },
        { time: DAY, depth: 0.3 },
      ],
      BASE,
      DAY,
    )
    expectClose(9810 * force, 4278.629_860_793_38, 1e-9)
    expect(isVented).toBe(true)
  })

  it('is gone with the last of the water, where the ground has not drained yet', () => {
    const drained = upliftAtTime(
      [
        { time: 0, depth: 0.5 },
        { time: 7200, depth: 0 },
      ],
      { base: 0.85, diffusivity: 1e-6, edgeFactor: 0.1 },
      7200,
    )
    expect(drained).toEqual({ force: 0, moment: 0, isVented: true })
  })

  it('agrees with finite differences on a triangular flood, rising and falling', () => {
    const flood: readonly DepthReading[] = [
      { time: 0, depth: 0 },
      { time: DAY / 2, depth: 0.55 },
      { time: DAY, depth: 0.1 },
    ]
    for (const time of [DAY / 4, DAY / 2, 0.7 * DAY, 0.95 * DAY]) {
      const { force, moment } = upliftAtTime(flood, BASE, time)
      const slow = diffuse(depthOf(flood), time)
      expectClose(force, slow.force, 2e-5, `force at ${time}`)
      expectClose(moment, slow.moment, 2e-5, `moment at ${time}`)
    }
    expect(upliftAtTime(flood, BASE, DAY / 4).isVented).toBe(false)
    expect(upliftAtTime(flood, BASE, 0.95 * DAY).isVented).toBe(true)
  })

  it('does not care into how many pieces a straight rise is cut', () => {
    const whole = [
      { time: 0, depth: 0 },
      { time: DAY, depth: 0.5 },
    ]
    const cut = Array.from({ length: 97 }, (_, i) => ({
      time: (i * DAY) / 96,
      depth: (0.5 * i) / 96,
    }))
    const a = upliftAtTime(whole, BASE, DAY)
    const b = upliftAtTime(cut, BASE, DAY)
    expectClose(b.force, a.force, 1e-10)
    expectClose(b.moment, a.moment, 1e-10)
  })

  it('passes smoothly from the early solution to the series', () => {
    const at = (tau: number) => (tau * 2.32 ** 2) / 1e-5
    const ramp = (time: number) =>
      upliftAtTime(
        [
          { time: 0, depth: 0 },
          { time, depth: time * 1e-6 },
        ],
        BASE,
        time,
      )
    const [before, after] = [ramp(at(0.01 - 1e-9)), ramp(at(0.01 + 1e-9))]
    expectClose(before.force, after.force, 1e-6)
    expectClose(before.moment, after.moment, 1e-6)
  })

  it.each([
    [
      'times that fall',
      [
        { time: 10, depth: 0 },
        { time: 5, depth: 1 },
      ],
      7,
    ],
    [
      'a moment outside',
      [
        { time: 0, depth: 0 },
        { time: 5, depth: 1 },
      ],
      6,
    ],
    [
      'a depth below nothing',
      [
        { time: 0, depth: -1 },
        { time: 5, depth: 1 },
      ],
      3,
    ],
    ['no readings', [], 0],
    [
      'no number',
      [
        { time: 0, depth: 0 },
        { time: Number.NaN, depth: 1 },
      ],
      0,
    ],
  ])('refuses %s', (_what, readings, time) => {
    expect(() => upliftAtTime(readings, BASE, time)).toThrow(OutOfRangeError)
  })
})
