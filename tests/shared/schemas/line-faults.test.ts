import { describe, expect, it } from 'vitest'
import { BEHIND_THE_KERB_STATIONS, LOW_ROAD_STATIONS } from '../../../server/demo/ferry-quay-lines'
import type { Station } from '../../../shared/schemas/line'
import { lineFaults, lineWarnings } from '../../../shared/schemas/line-faults'

const KNOWN = ['turf', 'concrete', 'asphalt', 'loose-gravel']

function changed(index: number, change: Partial<Station>): readonly Station[] {
  return LOW_ROAD_STATIONS.map((station, i) => (i === index ? { ...station, ...change } : station))
}

const faultsOf = (stations: readonly Station[], sectionLength = 10) =>
  lineFaults({ stations, sectionLength })

describe('faults of a survey', () => {
  it('are none on the lines of the demonstration', () => {
    for (const stations of [LOW_ROAD_STATIONS, BEHIND_THE_KERB_STATIONS]) {
      expect(faultsOf(stations)).toEqual([])
      expect(lineWarnings(stations, KNOWN)).toEqual([])
    }
  })

  it('are none where there is one station', () => {
    expect(faultsOf([LOW_ROAD_STATIONS[0]!])).toEqual([])
  })

  it.each([
    ['a ground in millimetres', 3, { groundLevel: 30_700 }, 'groundLevel', '-500 to 9000 m'],
    ['a chainage below zero', 0, { chainage: -1 }, 'chainage', '0 to 100000 m'],
    ['a width below zero', 3, { clearWidth: -1 }, 'clearWidth', '0 to 1000 m'],
    ['half a place', 3, { y: null }, 'y', '-10000000 to 10000000 m'],
  ])('name %s', (_what, index, change, field, allowed) => {
    const [fault, ...rest] = faultsOf(changed(index, change))
    expect(rest).toEqual([])
    expect(fault).toMatchObject({ path: `stations[${index}].${field}`, allowed })
  })

  it.each([
    ['the same chainage twice', 20],
    ['a chainage that falls', 15],
    ['stations less than a millimetre apart', 20.0005],
  ])('name %s', (_what, chainage) => {
    const faults = faultsOf(changed(3, { chainage }))
    expect(faults).toHaveLength(1)
    expect(faults[0]).toMatchObject({ path: 'stations[3].chainage', value: chainage })
    expect(faults[0]!.message).toContain('above the station before it, 20 m')
  })

  it('refuse more sections than a line is checked in', () => {
    const far = [LOW_ROAD_STATIONS[0]!, { ...LOW_ROAD_STATIONS[1]!, chainage: 2001 }]
    expect(faultsOf(far, 1)).toMatchObject([{ path: 'sectionLength', value: 1 }])
    expect(faultsOf(far, 2)).toEqual([])
  })
})

describe('a line that crosses itself', () => {
  const place = (x: number, y: number, i: number) => ({
    ...LOW_ROAD_STATIONS[0]!,
    chainage: 10 * i,
    x,
    y,
  })
  const figure = (...points: [number, number][]) => points.map(([x, y], i) => place(x, y, i))

  it('is refused by the stretches that cross', () => {
    const eight = figure([0, 0], [10, 0], [10, 10], [5, -5])
    expect(faultsOf(eight)).toMatchObject([{ path: 'stations[2].x' }])
    expect(faultsOf(eight)[0]!.message).toContain('ch 20 to 30 does not cross ch 0 to 10')
  })

  it('is no ring that closes, and no line without places', () => {
    expect(faultsOf(figure([0, 0], [10, 0], [10, 10], [0, 0]))).toEqual([])
    const bare = figure([0, 0], [10, 0], [10, 10], [5, -5])
    expect(faultsOf(bare.map((station) => ({ ...station, x: null, y: null })))).toEqual([])
  })
})

describe('warnings of a survey', () => {
  it('name a station whose place does not fit its chainage', () => {
    const [first, ...rest] = lineWarnings(changed(3, { x: 30.2 }), KNOWN)
    expect(first).toMatchObject({ path: 'stations[3].chainage' })
    expect(first!.message).toContain('30 is 10.00 m from the station before it, x and y are 10.20')
    expect(rest.map(({ path }) => path)).toEqual(['stations[4].chainage'])
    // More than 0.05 m, though less than 1 % of 10 m; then less than both.
    expect(lineWarnings(changed(3, { x: 30.08 }), KNOWN)).toHaveLength(2)
    expect(lineWarnings(changed(3, { x: 30.04 }), KNOWN)).toEqual([])
  })

  it('name a turn that no joint takes, and a line shorter than its section', () => {
    const turned = [0, 10, 20].map((chainage, i) => ({
      ...LOW_ROAD_STATIONS[0]!,
      chainage,
      x: [0, 10, 5][i]!,
      y: [0, 0, 8.66][i]!,
    }))
    expect(lineWarnings(turned, KNOWN)[0]!.message).toContain('turns by 120° at ch 10')
    const short = lineWarnings(LOW_ROAD_STATIONS.slice(0, 2), KNOWN, 25)
    expect(short).toMatchObject([{ path: 'sectionLength' }])
  })

  it('name each surface that the catalogue does not know, once', () => {
    const warnings = lineWarnings(LOW_ROAD_STATIONS, ['turf', 'asphalt', 'loose-gravel'])
    expect(warnings).toHaveLength(1)
    expect(warnings[0]).toMatchObject({ path: 'stations[0].surface' })
  })
})
