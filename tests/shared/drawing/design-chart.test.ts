import { describe, expect, it } from 'vitest'
import {
  DESIGN_RATIOS,
  designCrest,
  designCsv,
  designCurve,
  designTable,
} from '../../../shared/drawing/chart/design-curves'
import { presentCase } from '../../../shared/drawing/chart/present-case'
import { designChartScene } from '../../../shared/drawing/design-chart'
import { boxesMeet, textBox } from '../../../shared/drawing/label-placer'
import { sceneToSvg } from '../../../shared/drawing/scene-to-svg'
import { measureWith } from '../../../shared/drawing/text-width'
import { loadedShape } from '../../../shared/calc/loaded-shape/loaded-shape'
import { textResolver } from '../../../shared/texts/format-text'
import { methodAreaTexts } from '../../../shared/texts/method-area'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import type { SceneItem, TextItem } from '../../../shared/drawing/scene'
import { exampleSection } from '../../../shared/verification/example-section'

const resolve = textResolver(methodAreaTexts.en, 'metric')
const measure = measureWith(resolve)
const present = presentCase(exampleSection())

function sceneFor(width: number, height: number, marked = present) {
  return designChartScene({ view: { width, height }, measure, present: marked })
}

interface Tick {
  readonly value: number
  readonly at: number
}

/** Value at a place on an axis, straight between its first and its last tick. */
function valueAt(ticks: readonly Tick[], place: number): number {
  const [first, last] = [ticks[0]!, ticks.at(-1)!]
  return first.value + ((place - first.at) / (last.at - first.at)) * (last.value - first.value)
}

function ticksOf(items: readonly SceneItem[], name: string, placeOf: (text: TextItem) => number) {
  return items.flatMap((item): Tick[] => {
    const value = Number(item.id.replace(name, ''))
    const isTick = item.kind === 'text' && item.id.startsWith(name) && Number.isFinite(value)
    return isTick ? [{ value, at: placeOf(item) }] : []
  })
}

const readAcross = (items: readonly SceneItem[], name: string, x: number) =>
  valueAt(
    ticksOf(items, name, (text) => text.x),
    x,
  )

/** A label stands lower than its tick by 0.35 of its size, so that it is level with it. */
const readUp = (items: readonly SceneItem[], y: number) =>
  valueAt(
    ticksOf(items, 'crest-', (text) => text.y - 0.35 * text.size),
    y,
  )

describe('curves of the design chart', () => {
  // Figures derived by two programs; they stand in shared/verification as well.
  it.each([
    [0.5, 0.8284],
    [1, 0.925],
    [2, 0.965],
    [5, 0.9866],
  ])('p/(ρgD) %s stands up to h/D %s, where the water reaches the crest', (ratio, largest) => {
    const last = designCurve(ratio).points.at(-1)!
    expect(last.depth).toBeCloseTo(largest, 4)
    expect(last.crest).toBeCloseTo(last.depth, 6)
  })

  it('hold for every size: a tube of 0.7 m lies on the curve of its ratio', () => {
    const unitWeight = 9810
    const shape = loadedShape({
      diameter: 0.7,
      airPressure: 1.5 * unitWeight * 0.7,
      wettedSkirt: 3,
      depth: 0.6 * 0.7,
      unitWeight,
    })
    expect(shape.solved && shape.crest / 0.7).toBeCloseTo(designCrest(1.5, 0.6)!, 10)
  })

  it('fall with the water and rise with the pressure', () => {
    for (const ratio of DESIGN_RATIOS) {
      const crests = designCurve(ratio).points.map(({ crest }) => crest)
      for (let i = 1; i < crests.length; i += 1) expect(crests[i]!).toBeLessThan(crests[i - 1]!)
    }
    const at = DESIGN_RATIOS.map((ratio) => designCrest(ratio, 0.7)!)
    expect([...at].sort((a, b) => a - b)).toEqual(at)
  })
})

describe('the chart', () => {
  it.each([
    [900, 460],
    [360, 300],
  ])('names every curve and no two texts meet at %s × %s', (width, height) => {
    const { items } = sceneFor(width, height)
    const texts = items.filter((item) => item.kind === 'text')
    for (const ratio of DESIGN_RATIOS) {
      expect(texts.some(({ id }) => id === `name-${ratio}`)).toBe(true)
    }
    const boxes = texts.map((text) =>
      textBox(text, measure(text.message, text.size, text.weight), text.size),
    )
    for (const [i, box] of boxes.entries()) {
      expect(box.left).toBeGreaterThanOrEqual(0)
      expect(box.right).toBeLessThanOrEqual(width)
      const met = boxes.findIndex((other, j) => j > i && boxesMeet(box, other))
      expect(met === -1 ? '' : `${texts[i]!.id} meets ${texts[met]!.id}`).toBe('')
    }
  })

  it('marks the present case where its own figures put it', () => {
    expect(present.ratio).toBeCloseTo(15_000 / (9810 * 0.7), 10)
    const { items } = sceneFor(900, 460)
    const dot = items.find(({ id }) => id === 'now-dot')
    if (dot?.kind !== 'circle') throw new Error('no dot')
    // Read as a person reads it: from the ticks on both sides of it, in proportion.
    expect(readAcross(items, 'depth-', dot.cx)).toBeCloseTo(0.55 / 0.7, 6)
    expect(readUp(items, dot.cy)).toBeCloseTo(0.987, 3)
    const { loadedShape: shape } = evaluateSection(exampleSection())
    expect(readUp(items, dot.cy)).toBeCloseTo(shape.solved ? shape.crest / 0.7 : NaN, 6)
    const text = items.find(({ id }) => id === 'present')
    expect(text?.kind === 'text' && resolve(text.message)).toBe(
      'p/(ρgD) 2.18: crest/D 0.987 at h/D 0.79',
    )
  })

  it('has no point for a case in which no shape stands, and says so', () => {
    const fallen = { ratio: 0.3, depth: 0.9, crest: null }
    const { items, description } = sceneFor(900, 460, fallen)
    expect(items.some(({ id }) => id === 'now-dot')).toBe(false)
    expect(description.map(resolve).join(' ')).toContain('no shape stands at h/D 0.90')
  })

  it('reaches down to a case whose crest lies below the axis', () => {
    const low = { ratio: 0.2, depth: 0.4, crest: 0.71 }
    const { items } = sceneFor(900, 460, low)
    const dot = items.find(({ id }) => id === 'now-dot')
    expect(dot?.kind === 'circle' && dot.cy).toBeLessThan(460 - 40)
  })

  it('becomes a file', () => {
    const svg = sceneToSvg(sceneFor(1000, 620), { resolve, theme: 'light' })
    expect(svg).toContain('crest over diameter')
    expect(svg).not.toContain('method.chart')
    expect(svg).not.toContain('NaN')
  })
})

describe('figures behind the chart', () => {
  it('are the same in table and file', () => {
    const { rows, largest } = designTable([0.5, 2])
    const lines = designCsv([0.5, 2]).trimEnd().split('\r\n')
    expect(lines[0]).toBe('h/D,crest/D at p/(rho g D) 0.5,crest/D at p/(rho g D) 2')
    expect(lines).toHaveLength(rows.length + 2)
    expect(lines.at(-1)).toBe(`largest h/D,${largest.map((depth) => depth.toFixed(5)).join(',')}`)
    const half = rows.findIndex(({ depth }) => depth === 0.5)
    expect(lines[half + 1]).toBe(`0.5,${rows[half]!.crests.map((c) => c!.toFixed(5)).join(',')}`)
  })

  it('leave empty where no shape stands', () => {
    const { rows } = designTable([0.5])
    expect(rows.find(({ depth }) => depth === 0.9)!.crests).toEqual([null])
  })
})
