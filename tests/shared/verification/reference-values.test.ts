import { describe, expect, it } from 'vitest'
import { erfc } from '../../../shared/calc/numerics/erfc'
import { groundSeepage } from '../../../shared/calc/ground/ground-seepage'
import { CHECK_TAGS, CHECK_TOPICS } from '../../../shared/verification/check-row'
import { CHECK_ROWS, REFERENCE_ROWS } from '../../../shared/verification'

/** What the reference row prints; the test fails when the row is gone or says something else. */
function printed(id: string): string {
  const row = REFERENCE_ROWS.find((candidate) => candidate.id === id)
  if (!row) throw new Error(`no reference row ${id}`)
  return row.printed
}

/** A figure that the row prints and that the formula beside it gives to the digits printed. */
function closes(id: string, figure: string, computed: number, within?: number): void {
  expect(printed(id).replace(/(\d) (?=\d{3}\b)/g, '$1')).toContain(figure)
  const value = Number(figure.replace('−', '-'))
  const digits = figure.split('.')[1]?.length ?? 0
  expect(Math.abs(computed - value)).toBeLessThanOrEqual(within ?? 0.5001 * 10 ** -digits)
}

/** Probability that a standard normal variable is below −β. */
const below = (beta: number): number =>
  beta >= 0 ? erfc(beta / Math.SQRT2) / 2 : 1 - erfc(-beta / Math.SQRT2) / 2

describe('reference values that the product does not compute, by formulas of this test', () => {
  it('closes for the pressures under the edges of a rigid base, ΣV/B (1 ± 6e/B)', () => {
    closes('masonry-edge-pressures', '170.71', (680.39 / 8.25) * (1 + (6 * 1.4711) / 8.25))
    // The book carries rounded steps: 0.01 kPa.
    closes('masonry-edge-pressures', '−5.77', (680.39 / 8.25) * (1 - (6 * 1.4711) / 8.25), 0.01)
    // The book puts the resultant of its second section at the third point, 2 ΣV/B; worked out it
    // lies a little outside, and the toe takes 97.90 kPa.
    const net = 20 * (1.5 * 6 + (3.44 * 6) / 2) - (9.81 * 6 * 4.94) / 2
    closes('masonry-toe-pressure', '97.58', (2 * net) / 4.94)
  })

  it('closes for the gravity section with a drain', () => {
    const drain = 6 + (80 - 6) / 3
    const uplift = 9.81 * (((80 + drain) / 2) * 8 + ((drain + 6) / 2) * 48)
    const net = 23.5 * (6 * 84 + (75 * 50) / 2) + (9.81 * 6 * 4) / 2 - uplift
    closes('masonry-drained', '12975.4', uplift)
    closes('masonry-drained', '43048.9', net)
    const pressure =
      drain * 8 * 52 + ((80 - drain) * 4 * 160) / 3 + 6 * 48 * 24 + (drain - 6) * 24 * 32
    const weight = 23.5 * (6 * 84 * 53 + ((75 * 50) / 2) * (100 / 3)) + 9.81 * 12 * (4 / 3)
    const moment = weight - 9.81 * (pressure + (80 ** 3 - 6 ** 3) / 6)
    closes('masonry-drained', '18.069', moment / net)
    closes('masonry-drained', '1586.7', (net / 56) * (1 + (6 * (28 - moment / net)) / 56))
  })

  it('closes for the limit states UPL and HYD of EN 1997-1', () => {
    closes('upl-national', '1456.8', 1.1 * 1324.4)
    closes('upl-national', '961.2', 0.9 * 1068)
    closes('upl-national', '152', (100 * 1.1 * 1324.4) / (0.9 * 1068))
    closes('hyd', '44.5', (100 * 1.35 * 9.2) / (0.9 * 31))
    closes('hyd', '97.6', (100 * 1.35 * 40.6) / (0.9 * 62.4))
  })

  it('closes for the log that stops within a second', () => {
    closes('log-impact', '311', (1000 * 10) / 32.2)
  })

  it('closes for the water-filled tube, by stepping along its skin', () => {
    const { height, width, contact, tension } = waterFilledTube(0.05)
    closes('water-filled-tube', '0.202845', height)
    closes('water-filled-tube', '0.393620', width)
    closes('water-filled-tube', '0.264548', contact)
    closes('water-filled-tube', '0.015358', tension)
  })

  it('closes for the seepage form of the levee manual against the exact one', () => {
    const exact = (ratio: number) =>
      groundSeepage({ permeability: 1, head: 1, baseWidth: ratio, layerThickness: 1 })
    const differences = [1, 1.25, 1.5, 1.75, 2, 4, 10, 40].map(
      (ratio) => 100 * Math.abs(1 / (ratio + 0.86) / exact(ratio) - 1),
    )
    expect(printed('seepage-corps')).toContain('0.92 %')
    expect(Math.max(...differences)).toBeLessThanOrEqual(0.92)
    expect(Math.max(...differences)).toBeGreaterThan(0.91)
  })

  it('closes for the head under a base on a layer as thick as the base is wide', () => {
    closes('deep-base-finite', '0.3722', finiteLayerCentroid(1))
  })

  it('closes for the flow net and the levee on a blanket', () => {
    closes('flow-net', '2.6', (1e5 * 0.25) / 3600 / (4.5 * 0.6))
    const reach = Math.sqrt((0.1 / 1e-4) * 8 * 80)
    const residual = (20 * reach) / (reach + 110 + reach)
    closes('levee-underseepage', '9.357', residual)
    closes('levee-underseepage', '1.170', residual / 8)
  })

  it('closes for the suction head in feet and the loss after Hazen–Williams', () => {
    closes('suction-us', '46', 34 + 15 - 0.6 - 0.4 - 2)
    closes('hazen-williams', '5.990', (10.67 * 100 * (0.02 / 140) ** 1.852) / 0.1 ** 4.8704, 0.01)
  })

  it('closes for sandbags, (3H + 9H²)/2 per foot', () => {
    const bags = [1, 2, 3, 4].map((height) => (100 * (3 * height + 9 * height ** 2)) / 2)
    expect(printed('sandbag-count')).toBe(`${bags.join(', ')} per 100 ft`)
  })

  it('closes for reliability indices', () => {
    printed('reliability-index')
      .split(', ')
      .forEach((index, i) => expect(below(Number(index)) * 10 ** (i + 1)).toBeCloseTo(1, 3))
    const spread = Math.log(1 + 0.17 ** 2)
    const index = (Math.log(1.5) - spread / 2) / Math.sqrt(spread)
    closes('lognormal-index', '2.318', index)
    closes('lognormal-index', '1.02', 100 * below(index))
  })

  it('closes for the score interval: both ends lie 1.96 of their own deviations from the share', () => {
    const [draws, share, quantile] = [1000, 0.057, 1.959964]
    const middle = (share + quantile ** 2 / (2 * draws)) / (1 + quantile ** 2 / draws)
    const inner = (share * (1 - share)) / draws + quantile ** 2 / (4 * draws ** 2)
    const half = (quantile * Math.sqrt(inner)) / (1 + quantile ** 2 / draws)
    closes('score-interval', '0.044253', middle - half)
    closes('score-interval', '0.073137', middle + half)
    for (const end of [middle - half, middle + half]) {
      const deviation = Math.sqrt((end * (1 - end)) / draws)
      expect(Math.abs(end - share) / deviation).toBeCloseTo(quantile, 9)
    }
  })

  it('closes for the chance of underseepage at four heads', () => {
    const chance = (head: number) => {
      const mean = (1.1696 * head) / 20
      const spread = Math.log(1 + (0.3015 / 1.1696) ** 2)
      return below((Math.log(0.85) - Math.log(mean) + spread / 2) / Math.sqrt(spread))
    }
    closes('underseepage-chance', '0.8711', chance(20))
    closes('underseepage-chance', '0.499', chance(15))
    closes('underseepage-chance', '0.0547', chance(10))
    expect(chance(5) * 1e6).toBeCloseTo(7.3, 1)
  })
})

describe('the list of check values', () => {
  it('gives every row a topic, a tag and a source', () => {
    for (const row of [...CHECK_ROWS, ...REFERENCE_ROWS]) {
      expect(CHECK_TOPICS).toContain(row.topic)
      expect(CHECK_TAGS).toContain(row.tag)
      expect(row.source.length).toBeGreaterThan(4)
    }
  })

  it('says "from memory" in the source of what was recalled, and of nothing that was seen', () => {
    for (const { id, tag, source } of [...CHECK_ROWS, ...REFERENCE_ROWS]) {
      const isRecalled = source.includes('from memory')
      if (tag === 'memory') expect(isRecalled, id).toBe(true)
      if (tag === 'published') expect(isRecalled, id).toBe(false)
    }
  })
})

/** One quarter turn after another down the skin of a tube of perimeter 1, curvature = pressure/T. */
function waterFilledTube(topPressure: number) {
  const walk = (tension: number) => {
    const steps = 4000
    let [angle, x, y, length] = [0, 0, 0, 0]
    let widest = 0
    const slope = (a: number, depth: number) => {
      const perAngle = tension / (topPressure + depth)
      return [perAngle * Math.cos(a), perAngle * Math.sin(a), perAngle] as const
    }
    const step = Math.PI / steps
    for (let i = 0; i < steps; i += 1) {
      const [x1, y1] = slope(angle, y)
      const [x2, y2, l2] = slope(angle + step / 2, y + (step / 2) * y1)
      const [x3, y3, l3] = slope(angle + step / 2, y + (step / 2) * y2)
      const [x4, y4, l4] = slope(angle + step, y + step * y3)
      length += (step / 6) * (tension / (topPressure + y) + 2 * l2 + 2 * l3 + l4)
      x += (step / 6) * (x1 + 2 * x2 + 2 * x3 + x4)
      y += (step / 6) * (y1 + 2 * y2 + 2 * y3 + y4)
      angle += step
      widest = Math.max(widest, x)
    }
    return { height: y, width: 2 * widest, contact: 2 * x, perimeter: 2 * length + 2 * x, tension }
  }
  let [low, high] = [1e-4, 0.1]
  for (let i = 0; i < 45; i += 1) {
    const middle = (low + high) / 2
    if (walk(middle).perimeter < 1) low = middle
    else high = middle
  }
  return walk(low)
}

/**
 * Centroid of the head from the wet edge in B, by the map of a base on a layer of finite thickness:
 * head = ½ − F(ψ, m)/2K, tanh(πx/2T) = m sin ψ, m = tanh(πB/4T).
 */
function finiteLayerCentroid(ratio: number): number {
  const m = Math.tanh((Math.PI * ratio) / 4)
  const steps = 4000
  const integral: number[] = [0]
  const place: number[] = [0]
  for (let i = 1; i <= steps; i += 1) {
    const psi = (Math.PI / 2) * ((i - 0.5) / steps)
    integral.push(integral[i - 1]! + Math.PI / 2 / steps / Math.sqrt(1 - (m * Math.sin(psi)) ** 2))
    place.push((2 / Math.PI) * Math.atanh(m * Math.sin((Math.PI / 2) * (i / steps))))
  }
  // The excess over ½ is odd about the middle: moment = B²/4 − 2 ∫ x F/2K dx over half the base.
  let odd = 0
  for (let i = 1; i <= steps; i += 1) {
    const [x0, x1] = [place[i - 1]!, place[i]!]
    const mean = (integral[i - 1]! + integral[i]!) / 2 / integral[steps]! / 2
    odd += ((x0 + x1) / 2) * mean * (x1 - x0)
  }
  return (ratio ** 2 / 4 - 2 * odd) / (ratio / 2) / ratio
}
