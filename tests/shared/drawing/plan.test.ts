import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { LOW_ROAD_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { LOW_ROAD_ENDS, LOW_ROAD_MARKS } from '../../../server/demo/ferry-quay-marks'
import { offsetPath, pointAt, locatedStations } from '../../../shared/calc/line/line-path'
import { longSectionScene } from '../../../shared/drawing/long-section'
import { hasPlan, planScene, type PlanInput } from '../../../shared/drawing/plan'
import { placedPicture } from '../../../shared/drawing/plan/placed-picture'

const input = (change: Partial<PlanInput> = {}): PlanInput => ({
  view: { width: 520, height: 560 },
  stations: LOW_ROAD_STATIONS,
  marks: LOW_ROAD_MARKS,
  ends: LOW_ROAD_ENDS,
  runs: [{ from: 0, to: 180, diameter: 0.7, skirtLength: 2.2, contactWidth: 0.12 }],
  sections: [{ from: 0, to: 180, verdict: 'fails', holdsToLevel: 3.2 }],
  weakest: { chainage: 45, holdsToLevel: 3.2 },
  place: 45,
  flowing: [0],
  alternative: null,
  window: null,
  ...change,
})
const path = locatedStations(LOW_ROAD_STATIONS)

describe('a plan', () => {
  it('is to scale in every direction, and a zoom keeps it so', () => {
    const { frame } = planScene(input())
    const [a, b] = [frame.toPoint({ x: 0, y: 0 }), frame.toPoint({ x: 3, y: 4 })]
    expect(Math.hypot(b.x - a.x, b.y - a.y)).toBeCloseTo(5 * frame.scale, 9)
    const near = planScene(input({ window: { centre: { x: 40, y: 0 }, scale: 20 } })).frame
    expect(near.toPoint({ x: 40, y: 0 })).toEqual({ x: 260, y: 280 })
    expect(near.scale).toBe(20)
  })

  it('has the water on the left: the line runs down the page, and the wet side is its right', () => {
    const { frame } = planScene(input())
    const [first, last] = [path[0]!, path[path.length - 1]!].map(frame.toPoint)
    expect(last!.y).toBeGreaterThan(first!.y)
    expect(last!.x).toBeCloseTo(first!.x, 6)
    // The river is on the right when walking from chainage 0.
    const wet = offsetPath(path, -5).map(frame.toPoint)
    const line = path.map(frame.toPoint)
    expect(wet[9]!.x).toBeLessThan(line[9]!.x)
  })

  it('finds the chainage under a pointer, and shows nothing outside of its frame', () => {
    const { frame } = planScene(input())
    fc.assert(
      fc.property(fc.double({ min: 0, max: 180, noNaN: true }), (chainage) => {
        const { chainage: found, distance } = frame.nearest(frame.toPoint(pointAt(path, chainage)))
        expect(distance).toBeLessThan(1e-6)
        expect(found).toBeCloseTo(chainage, 6)
      }),
      { numRuns: 100 },
    )
  })

  it('says which marks lead water, by colour and in words', () => {
    const { items, description } = planScene(input())
    expect(items.find(({ id }) => id === 'mark-0')).toMatchObject({ role: 'sectionFails' })
    expect(items.find(({ id }) => id === 'mark-1')).toMatchObject({ role: 'sectionUnchecked' })
    expect(description).toContainEqual({
      key: 'linePlan.drawing.describeMarks',
      values: { count: 2, open: 1 },
    })
  })

  it('needs two places', () => {
    expect(hasPlan(LOW_ROAD_STATIONS)).toBe(true)
    expect(hasPlan(LOW_ROAD_STATIONS.slice(0, 1))).toBe(false)
    expect(hasPlan(LOW_ROAD_STATIONS.map((row) => ({ ...row, x: null, y: null })))).toBe(false)
  })
})

it('a picture lies with both of its points on theirs, and is not stretched', () => {
  const { frame } = planScene(input())
  const placed = {
    fileId: 'f',
    first: { u: 0.2, v: 0.3, x: 10, y: 0 },
    second: { u: 0.7, v: 0.9, x: 60, y: 40 },
  }
  const [a, b, c, d, e, f] = placedPicture(placed, { width: 800, height: 600 }, frame)
  for (const { u, v, x, y } of [placed.first, placed.second]) {
    const [px, py] = [u * 800, v * 600]
    const point = frame.toPoint({ x, y })
    expect(a * px + c * py + e).toBeCloseTo(point.x, 9)
    expect(b * px + d * py + f).toBeCloseTo(point.y, 9)
  }
  expect([a, b]).toEqual([d, -c])
})

describe('a long section of a part', () => {
  const section = (window: { from: number; to: number } | null) =>
    longSectionScene({
      view: { width: 900, height: 260 },
      stations: LOW_ROAD_STATIONS,
      sectionLength: 10,
      waterLevel: 3.42,
      band: { low: 3.3, high: 3.54 },
      runs: [{ from: 0, to: 180, diameter: 0.7 }],
      sections: [{ from: 0, to: 180, verdict: 'holds', holdsToLevel: 3.5, crestLevel: 3.6 }],
      weakest: { chainage: 145, holdsToLevel: 3.1 },
      place: 45,
      marks: LOW_ROAD_MARKS,
      ends: LOW_ROAD_ENDS,
      window,
    })

  it('shows that part alone, larger', () => {
    const part = section({ from: 40, to: 100 })
    expect([part.frame.from, part.frame.to]).toEqual([40, 100])
    expect(part.items.some(({ id }) => id === 'mark-0')).toBe(true)
    expect(part.items.some(({ id }) => id === 'mark-1')).toBe(false)
    expect(part.items.some(({ id }) => id === 'weakest')).toBe(false)
  })

  it('shows all of the line for a window around it, and for one too short', () => {
    for (const window of [{ from: -5, to: 500 }, { from: 50, to: 50.1 }, null]) {
      expect(section(window).frame.to).toBe(180)
    }
  })

  it('draws band, crest, turns, low spots and the wall at its start', () => {
    const ids = section(null).items.map(({ id }) => id)
    for (const id of ['band', 'crest', 'turns', 'low-spots', 'end-start', 'turn-60', 'freeboard']) {
      expect(ids).toContain(id)
    }
  })
})
