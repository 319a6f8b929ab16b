import { describe, expect, it } from 'vitest'
import { lineCrossing } from '../../../shared/calc/line/line-crossings'
import {
  locatedStations,
  nearestOn,
  offsetPath,
  pathBetween,
  pointAt,
} from '../../../shared/calc/line/line-path'
import { lineTurns, isDirectionKnown } from '../../../shared/calc/line/line-turns'
import { lowSpots } from '../../../shared/calc/line/low-spots'
import { pipeInflow } from '../../../shared/calc/line/pipe-inflow'
import type { Station } from '../../../shared/schemas/line'
import { lineMarkSchema, type LineMark } from '../../../shared/schemas/mark'
import { expectClose } from '../../support/close-to'

type Place = readonly [x: number | null, y: number | null]

/** Stations 10 m apart by chainage at these places. */
function surveyed(...places: readonly Place[]): Station[] {
  return places.map(([x, y], i) => ({
    chainage: 10 * i,
    x,
    y,
    groundLevel: 3,
    surface: 'turf',
    clearWidth: null,
    note: '',
  }))
}

const levels = (...grounds: readonly number[]): Station[] =>
  surveyed(...grounds.map((): Place => [null, null])).map((station, i) => ({
    ...station,
    groundLevel: grounds[i]!,
  }))

const DEGREE = Math.PI / 180
const turnMark = (chainage: number, angle: number | null): LineMark =>
  lineMarkSchema.parse({ kind: 'turn', chainage, angle })

describe('turns of a line', () => {
  it('are those of 5° and more, positive to the left', () => {
    const legs = (turn: number) =>
      surveyed([0, 0], [10, 0], [10 + 10 * Math.cos(turn), 10 * Math.sin(turn)])
    expect(lineTurns(legs(4.9 * DEGREE))).toEqual([])
    const [left] = lineTurns(legs(5.1 * DEGREE))
    expect(left!.chainage).toBe(10)
    expectClose(left!.angle, 5.1 * DEGREE, 1e-9)
    expectClose(lineTurns(legs(-90 * DEGREE))[0]!.angle, -90 * DEGREE, 1e-9)
  })

  it('are taken the short way round where the line heads west', () => {
    const west = surveyed([0, 0], [-10, 1], [-20, 0])
    expectClose(lineTurns(west)[0]!.angle, 2 * Math.atan2(1, 10), 1e-9)
    const other = surveyed([0, 0], [-10, -1], [-20, 0])
    expectClose(lineTurns(other)[0]!.angle, -2 * Math.atan2(1, 10), 1e-9)
  })

  it('come from marks only where the survey does not tell the direction', () => {
    const half = surveyed([0, 0], [10, 0], [20, 0], [null, null], [null, null], [null, null])
    const marks = [turnMark(40, 0.5), turnMark(10, 0.4), turnMark(30, -0.3), turnMark(35, null)]
    expect(lineTurns(half, marks)).toEqual([
      { chainage: 30, angle: -0.3 },
      { chainage: 40, angle: 0.5 },
    ])
    expect(isDirectionKnown(half, 10)).toBe(true)
    expect(isDirectionKnown(half, 15)).toBe(true)
    expect(isDirectionKnown(half, 20)).toBe(false)
    expect(isDirectionKnown(half, 25)).toBe(false)
    expect(isDirectionKnown(half, 35)).toBe(false)
    // The ends of a line turn nowhere.
    expect(isDirectionKnown(half, 0)).toBe(true)
    expect(isDirectionKnown(half, 50)).toBe(true)
    expect(lineTurns(half, [turnMark(0, 1), turnMark(50, 1)])).toEqual([])
  })

  it('sort what was surveyed and what was marked into one order', () => {
    const tail = surveyed([null, null], [null, null], [20, 0], [30, 0], [30, 10])
    expect(lineTurns(tail, [turnMark(10, 0.2)]).map(({ chainage }) => chainage)).toEqual([10, 30])
  })
})

describe('a line that crosses itself', () => {
  it('is found by the first stations of both stretches', () => {
    expect(lineCrossing(surveyed([0, 0], [10, 10], [10, 0], [0, 10]))).toEqual({
      first: 0,
      second: 2,
    })
    // The same walked the other way, and mirrored.
    expect(lineCrossing(surveyed([0, 10], [10, 0], [10, 10], [0, 0]))).toEqual({
      first: 0,
      second: 2,
    })
    expect(lineCrossing(surveyed([20, 0], [12, 0], [12, 9], [16, 9], [16, -5]))).toEqual({
      first: 0,
      second: 3,
    })
  })

  it('is none where stretches only meet, pass each other or are not known', () => {
    expect(lineCrossing(surveyed([0, 0], [10, 0], [10, 10], [0, 10], [0, 0]))).toBeNull()
    expect(lineCrossing(surveyed([0, 0], [10, 0], [10, 5], [5, 5], [5, 0]))).toBeNull()
    expect(lineCrossing(surveyed([0, 0], [10, 10], [20, 0], [21, 0], [21, 9]))).toBeNull()
    expect(lineCrossing(surveyed([0, 0], [10, 10], [10, null], [0, 10]))).toBeNull()
    expect(lineCrossing(surveyed([0, 0], [10, 10], [null, 0], [0, 10]))).toBeNull()
    expect(lineCrossing([])).toBeNull()
  })
})

describe('places along a line', () => {
  const path = locatedStations(surveyed([0, 0], [8, 6], [null, 3], [8, 26], [3, null]))

  it('are those of stations that have both coordinates', () => {
    expect(path).toEqual([
      { chainage: 0, x: 0, y: 0 },
      { chainage: 10, x: 8, y: 6 },
      { chainage: 30, x: 8, y: 26 },
    ])
  })

  it('lie straight between them, and at the nearest beyond the ends', () => {
    expect(pointAt(path, 5)).toEqual({ x: 4, y: 3 })
    expect(pointAt(path, 10)).toMatchObject({ x: 8, y: 6 })
    expect(pointAt(path, 15)).toEqual({ x: 8, y: 11 })
    expect(pointAt(path, -3)).toMatchObject({ x: 0, y: 0 })
    expect(pointAt(path, 99)).toMatchObject({ x: 8, y: 26 })
  })

  it('make a stretch with the stations between its ends', () => {
    expect(pathBetween(path, 5, 15)).toEqual([
      { chainage: 5, x: 4, y: 3 },
      { chainage: 10, x: 8, y: 6 },
      { chainage: 15, x: 8, y: 11 },
    ])
    expect(pathBetween(path, 10, 30)).toHaveLength(2)
  })

  it('are found from a point beside the line', () => {
    // By hand: (8, 11) moved 2 m to the right of the second leg.
    expect(nearestOn(path, { x: 10, y: 11 })).toEqual({ chainage: 15, distance: 2 })
    // 5 m to the left of the middle of the first leg: (4, 3) + 5 (−0.6, 0.8).
    const beside = nearestOn(path, { x: 1, y: 7 })
    expectClose(beside.chainage, 5, 1e-12)
    expectClose(beside.distance, 5, 1e-12)
    expect(nearestOn(path, { x: -3, y: -4 })).toEqual({ chainage: 0, distance: 5 })
    expect(nearestOn(path, { x: 8, y: 30 })).toEqual({ chainage: 30, distance: 4 })
    const twice = [path[0]!, { ...path[0]!, chainage: 1 }]
    expect(nearestOn(twice, { x: 3, y: 4 })).toEqual({ chainage: 0, distance: 5 })
  })

  it('move to the dry side, which is on the left', () => {
    const moved = offsetPath(path, 2)
    // By hand: normals (−0.6, 0.8) and (−1, 0), averaged (−1.6, 0.8)/√3.2 at the turn.
    expectClose(moved[0]!.x, -1.2, 1e-12)
    expectClose(moved[0]!.y, 1.6, 1e-12)
    expectClose(moved[1]!.x, 8 - 3.2 / Math.sqrt(3.2), 1e-12)
    expectClose(moved[1]!.y, 6 + 1.6 / Math.sqrt(3.2), 1e-12)
    expectClose(moved[2]!.x, 6, 1e-12)
    expectClose(moved[2]!.y, 26, 1e-12)
    const back = [
      { x: 0, y: 0 },
      { x: 10, y: 0 },
      { x: 0, y: 0 },
    ]
    expect(offsetPath(back, 2)[1]).toEqual({ x: 10, y: 0 })
    expect(offsetPath([back[0]!, back[0]!], 2)).toEqual([back[0], back[0]])
  })
})

describe('low spots', () => {
  it('are where the ground rises 3 cm and more to both sides', () => {
    expect(lowSpots(levels(3, 2.9, 3.1))).toEqual([{ chainage: 10, groundLevel: 2.9 }])
    expect(lowSpots(levels(3, 2.98, 3.1))).toEqual([])
    expect(lowSpots(levels(3.1, 2.98, 3))).toEqual([])
    // A rise is taken from all stations before the ground falls below the spot.
    expect(lowSpots(levels(3, 2.99, 2.98, 2.99, 3.02))).toEqual([])
    expect(lowSpots(levels(3.02, 2.99, 2.98, 2.99, 3.02))).toEqual([
      { chainage: 20, groundLevel: 2.98 },
    ])
  })

  it('are none at the ends, and one at the first station of a level hollow', () => {
    expect(lowSpots(levels(2, 3, 2))).toEqual([])
    expect(lowSpots(levels(3, 2.5, 2.5, 3))).toEqual([{ chainage: 10, groundLevel: 2.5 }])
    expect(lowSpots(levels(3, 2.5, 2.6, 2.4, 3)).map(({ chainage }) => chainage)).toEqual([10, 30])
  })
})

it('lets through a pipe what an orifice lets through', () => {
  // By hand: 0.6 × π/4 × 0.3² × √(2 × 9.81 × 0.5) = 0.13284 m³/s.
  expect(pipeInflow({ diameter: 0.3, head: 0.5, gravity: 9.81 })).toBeCloseTo(0.13284, 5)
  expect(pipeInflow({ diameter: 0.3, head: 0, gravity: 9.81 })).toBe(0)
  expect(pipeInflow({ diameter: 0.3, head: -0.1, gravity: 9.81 })).toBe(0)
})
