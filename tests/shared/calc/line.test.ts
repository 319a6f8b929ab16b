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
import { lineSections } from '../../../shared/calc/line/line-sections'
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
    const hole = surveyed([0, 0], [null, null], [20, 0])
    expect(isDirectionKnown(hole, 10)).toBe(false)
    expect(isDirectionKnown(surveyed([0, 0], [10, 0], [20, 0]), 10)).toBe(true)
    for (const place of [
      [null, 0],
      [10, null],
    ] as const) {
      expect(isDirectionKnown(surveyed([0, 0], place, [20, 0]), 10)).toBe(false)
      expect(isDirectionKnown(surveyed([0, 0], [10, 0], place), 15)).toBe(false)
      expect(isDirectionKnown(surveyed(place, [10, 0], [20, 0]), 5)).toBe(false)
    }
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

  it('is found however far the line strays in between, the earlier stretch first', () => {
    const stray = surveyed([0, 0], [10, 10], [30, 0], [30, -5], [-2, 6])
    expect(lineCrossing(stray)).toEqual({ first: 0, second: 3 })
  })

  it('is none where one coordinate of an end is not known', () => {
    const leg = [
      [-5, -5],
      [10, 10],
      [10, -5],
    ] as const
    expect(lineCrossing(surveyed(...leg, [0, 5]))).toEqual({ first: 0, second: 2 })
    expect(lineCrossing(surveyed(...leg, [null, 5]))).toBeNull()
    expect(lineCrossing(surveyed(...leg, [-8, null]))).toBeNull()
    expect(lineCrossing(surveyed(leg[0], leg[1], [null, 5], leg[2]))).toBeNull()
    expect(lineCrossing(surveyed(leg[0], leg[1], [-8, null], leg[2]))).toBeNull()
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
  const stations = surveyed([0, 0], [8, 6], [null, 3], [8, 26], [3, null])
  const path = [
    { chainage: 0, x: 0, y: 0 },
    { chainage: 10, x: 8, y: 6 },
    { chainage: 30, x: 8, y: 26 },
  ]

  it('are those of stations that have both coordinates', () => {
    expect(locatedStations(stations)).toEqual(path)
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

describe('sections of a line', () => {
  const ground = (
    chainage: number,
    groundLevel: number,
    change: Partial<Station> = {},
  ): Station => ({
    ...levels(groundLevel)[0]!,
    chainage,
    ...change,
  })

  it('are cut at every surface, each piece with its lowest ground', () => {
    const line = [
      ground(0, 3, { clearWidth: 4 }),
      ground(6, 2.4, { surface: 'gravel', clearWidth: 3 }),
      ground(8, 2.6, { clearWidth: 5 }),
      ground(20, 2),
    ]
    const [first, second] = lineSections(line, 10)
    expect(first!.pieces).toEqual([
      { from: 0, to: 6, surface: 'turf', lowestGround: 2.4, lowestAt: 6 },
      { from: 6, to: 8, surface: 'gravel', lowestGround: 2.4, lowestAt: 6 },
      { from: 8, to: 10, surface: 'turf', lowestGround: 2.5, lowestAt: 10 },
    ])
    expect(first!.clearWidth).toBe(3)
    expect(second!.pieces).toEqual([
      { from: 10, to: 20, surface: 'turf', lowestGround: 2, lowestAt: 20 },
    ])
    expect(second!.clearWidth).toBe(5)
  })

  it('begin and end on stations without a piece of no length, and join pieces of one surface', () => {
    const line = [ground(0, 3), ground(10, 2.5), ground(15, 2.2), ground(20, 2.9)]
    const sections = lineSections(line, 10)
    expect(sections.map(({ pieces }) => pieces.map(({ from, to }) => [from, to]))).toEqual([
      [[0, 10]],
      [[10, 20]],
    ])
    expect(sections[1]!.pieces[0]).toMatchObject({ lowestGround: 2.2, lowestAt: 15 })
    expect(sections[0]!.clearWidth).toBeNull()
  })

  it('are as many as the run needs, the last one as long as is left', () => {
    const sections = lineSections([ground(5, 3), ground(27, 3)], 10)
    expect(sections.map(({ from, to }) => [from, to])).toEqual([
      [5, 15],
      [15, 25],
      [25, 27],
    ])
    expect(lineSections([ground(0, 3), ground(20 + 1e-7, 3)], 10)).toHaveLength(2)
    expect(lineSections([ground(0, 3)], 10)).toHaveLength(1)
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
