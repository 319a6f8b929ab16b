import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { factorChartScene, type FactorChartInput } from '../../../shared/drawing/factor-chart'
import { boxesMeet } from '../../../shared/drawing/label-placer'
import { shapePath } from '../../../shared/drawing/path-data'
import type { Scene } from '../../../shared/drawing/scene'
import {
  allWords,
  boxOf,
  has,
  item,
  pointsOf,
  reachOf,
  say,
  shapesOf,
  textsOf,
  tube,
} from './drawn-case'

function series(id: string, edgeFactor: number, depths = 60) {
  const section = tube({ uplift: { edgeFactor } })
  return {
    id,
    label: { key: `drawing.edge${edgeFactor === 1 ? 'Open' : 'Sealed'}` },
    style: edgeFactor === 1 ? ('chosen' as const) : ('alternative' as const),
    points: Array.from({ length: depths }, (_, index) => {
      const depth = (0.7 * (index + 1)) / depths
      const at = { ...section, water: { ...section.water, depth } }
      return { depth, factor: evaluateSection(at).sliding.factor }
    }),
  }
}

function chart(change: Partial<FactorChartInput> = {}): FactorChartInput {
  return {
    view: { width: 440, height: 220 },
    series: [series('open', 1), series('sealed', 0)],
    required: 1.5,
    greatestDepth: 0.7,
    now: 0.42,
    holdsTo: 0.4896,
    ...change,
  }
}

function faultsOf(scene: Scene): readonly string[] {
  const inside = (x: number, y: number) =>
    x >= -0.5 && x <= scene.width + 0.5 && y >= -0.5 && y <= scene.height + 0.5
  const texts = textsOf(scene).map((text) => ({ id: text.id, box: boxOf(text) }))
  return [
    ...shapesOf(scene)
      .filter(
        (shape) =>
          /NaN|Infinity/.test(shapePath(shape)) || !reachOf(shape).every((p) => inside(p.x, p.y)),
      )
      .map(({ id }) => `${id} leaves the view`),
    ...texts
      .filter(({ box }) => !inside(box.left, box.top) || !inside(box.right, box.bottom))
      .map(({ id }) => `text ${id} is clipped`),
    ...texts.flatMap((a, index) =>
      texts
        .slice(index + 1)
        .flatMap((b) => (boxesMeet(a.box, b.box) ? [`${a.id} on ${b.id}`] : [])),
    ),
    ...(/drawing\.[\w.]+|\{\w+\}|NaN/.test(allWords(scene)) ? ['a text is missing'] : []),
  ]
}

describe('the factor chart', () => {
  const scene = factorChartScene(chart())

  it('crosses the required factor where the section stops to hold', () => {
    const required = pointsOf(item(scene, 'path', 'required').d)[0]!.y
    const holds = pointsOf(item(scene, 'path', 'holds-to').d)[0]!.x
    const curve = pointsOf(item(scene, 'path', 'curve-open').d)
    const after = curve.findIndex(({ y }) => y > required)
    expect(curve[after - 1]!.x).toBeLessThan(holds)
    expect(curve[after]!.x).toBeGreaterThan(holds)
  })

  it('puts the dot on the curve at the depth of now', () => {
    const dot = item(scene, 'circle', 'now-dot')
    const now = pointsOf(item(scene, 'path', 'now').d)[0]!
    const axis = item(scene, 'path', 'axes')
    const bottom = pointsOf(axis.d)[1]!.y
    const required = pointsOf(item(scene, 'path', 'required').d)[0]!.y
    expect(dot.cx).toBeCloseTo(now.x, 1)
    const { factor } = evaluateSection(tube()).sliding
    expect(((bottom - dot.cy) / (bottom - required)) * 1.5).toBeCloseTo(factor!, 1)
  })

  it('names every curve beside it, without a legend', () => {
    expect(say(item(scene, 'text', 'name-open').message)).toBe('open edge')
    expect(say(item(scene, 'text', 'name-sealed').message)).toBe('sealed edge')
    expect(item(scene, 'path', 'curve-sealed').role).toBe('curveAlternative')
  })

  it('cuts off high factors exactly at the upper edge, and says so', () => {
    const top = pointsOf(item(scene, 'path', 'axes').d)[0]!.y
    const curve = pointsOf(item(scene, 'path', 'curve-open').d)
    expect(Math.min(...curve.map(({ y }) => y))).toBeCloseTo(top, 1)
    expect(say(item(scene, 'text', 'capped').message)).toBe('above 3.75 not drawn')
  })

  it('does not speak of a cut where every factor fits', () => {
    const low = { ...series('open', 1), points: [point(0.1, 2), point(0.7, 1.1)] }
    expect(has(factorChartScene(chart({ series: [low] })), 'capped')).toBe(false)
  })

  it('leaves a gap where there is nothing to compare', () => {
    const points = [
      point(0.1, 2),
      point(0.2, 1.8),
      point(0.3, null),
      point(0.4, 1.4),
      point(0.5, 1),
    ]
    const broken = factorChartScene(chart({ series: [{ ...series('open', 1), points }] }))
    expect(item(broken, 'path', 'curve-open').d.match(/M/g)).toHaveLength(2)
  })

  it('says that nothing holds where there is no factor at all', () => {
    const none = { ...series('open', 1), points: [point(0.1, null), point(0.7, null)] }
    const empty = factorChartScene(chart({ series: [none], holdsTo: null }))
    expect(say(item(empty, 'text', 'no-factor').message)).toContain(
      'nothing keeps the tube in place',
    )
    expect(allWords(empty)).toContain('No depth of water can be relied on.')
    expect(has(empty, 'holds-to')).toBe(false)
  })

  it('draws no requirement where the basis has none', () => {
    const free = factorChartScene(chart({ required: null }))
    expect(has(free, 'required')).toBe(false)
    expect(has(free, 'shortfall')).toBe(false)
  })
})

function point(depth: number, factor: number | null) {
  return { depth, factor }
}

it('keeps every text whole and apart, whatever the curves do', () => {
  const factor = fc.option(fc.double({ min: -2, max: 60, noNaN: true }))
  const input = fc.record({
    width: fc.integer({ min: 280, max: 900 }),
    height: fc.integer({ min: 150, max: 400 }),
    factors: fc.array(factor, { minLength: 2, maxLength: 40 }),
    others: fc.array(factor, { minLength: 2, maxLength: 40 }),
    diameter: fc.double({ min: 0.2, max: 3, noNaN: true }),
    now: fc.double({ min: 0, max: 1.5, noNaN: true }),
    holdsTo: fc.option(fc.double({ min: 0, max: 1.5, noNaN: true })),
    required: fc.option(fc.constantFrom(1, 1.1, 1.3, 1.5)),
  })
  const curve = (factors: readonly (number | null)[], diameter: number) =>
    factors.map((f, index) => point((diameter * index) / (factors.length - 1), f))
  fc.assert(
    fc.property(input, ({ width, height, factors, others, diameter, ...rest }) => {
      const scene = factorChartScene({
        view: { width, height },
        series: [
          { ...series('open', 1, 1), points: curve(factors, diameter) },
          { ...series('sealed', 0, 1), points: curve(others, diameter) },
        ],
        greatestDepth: diameter,
        required: rest.required,
        now: rest.now * diameter,
        holdsTo: rest.holdsTo === null ? null : rest.holdsTo * diameter,
      })
      expect(faultsOf(scene)).toEqual([])
    }),
    { numRuns: 300 },
  )
})
