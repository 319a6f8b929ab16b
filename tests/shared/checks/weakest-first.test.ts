import { describe, expect, it } from 'vitest'
import { OFF_THE_GRAVEL_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { LOW_ROAD_ENDS, LOW_ROAD_MARKS } from '../../../server/demo/ferry-quay-marks'
import { LOW_ROAD_SCENARIOS } from '../../../server/demo/ferry-quay-scenarios'
import { MILL_LANE } from '../../../server/demo/ferry-quay-store'
import { lineSections } from '../../../shared/calc/line/line-sections'
import { lowSpots } from '../../../shared/calc/line/low-spots'
import { runsWithSection } from '../../../shared/checks/layout/best-layout'
import { checkLine, type HoldingProfiles } from '../../../shared/checks/line-check'
import { isAtHand } from '../../../shared/checks/remedies/remedy'
import { weakestFirst } from '../../../shared/checks/remedies/weakest-first'
import { waterWays } from '../../../shared/checks/water-ways'
import type { ScenarioContent } from '../../../shared/schemas/scenario'
import { TUBES } from '../../support/tubes'

const SURVEY = { stations: OFF_THE_GRAVEL_STATIONS, sectionLength: 10, marks: LOW_ROAD_MARKS }
const LINE = { ...SURVEY, ends: LOW_ROAD_ENDS }
const CONTENT = LOW_ROAD_SCENARIOS[1]!.content
const STORE = {
  depots: [{ ...MILL_LANE, id: '0', updatedAt: 0, updatedBy: { id: 'a', name: 'A' }, version: 1 }],
}
const profiles: HoldingProfiles = new Map()

const places = (content: ScenarioContent, most = 1) =>
  weakestFirst(
    {
      survey: SURVEY,
      content,
      answer: checkLine(SURVEY, content, profiles),
      sizes: TUBES,
      store: STORE,
      profiles,
    },
    most,
  )

const down = (level: number | null) => level !== null && Math.floor(level * 1000) / 1000

// The order of an independent program for the same rules; with skirt missing at bends ch 50 comes first.
describe('weakest first at Ferry Quay', () => {
  it('goes from the turn by the slipway and the turf to the quay, each with its edge weighed', () => {
    let content = CONTENT
    const seen: [number, number | false, string][] = []
    for (let step = 0; step < 5; step += 1) {
      const [place] = places(content)
      const [remedy] = place!.remedies
      seen.push([place!.answer.from, down(place!.answer.holdsToLevel), remedy!.kind])
      const sections = lineSections(SURVEY.stations, 10, SURVEY.marks)
      content = { ...content, sizes: [...runsWithSection(sections, content, remedy!.run!)] }
    }
    expect(seen).toEqual([
      [50, 3.384, 'weigh'],
      [40, 3.403, 'weigh'],
      [110, 3.423, 'weigh'],
      [90, 3.429, 'weigh'],
      [100, 3.429, 'weigh'],
    ])
    expect(down(checkLine(SURVEY, content, profiles).weakest.holdsToLevel)).toBe(3.441)
  })

  it('names what limits next, and what a remedy costs', () => {
    const [place] = places(CONTENT)
    const weigh = place!.remedies.find(({ kind }) => kind === 'weigh')!
    expect(weigh).toMatchObject({ isEnough: true, mass: 400, crewTime: 600, short: 0 })
    expect(weigh.next.place).toBe(45)
    expect(down(weigh.next.holdsToLevel)).toBe(3.403)
    expect(place!.remedies.find(({ kind }) => kind === 'move')!.value).toBeCloseTo(2.8755, 3)
  })

  it('offers a larger tube that is not in the store after what is there', () => {
    const weak = places(CONTENT, 5).find(({ answer }) => answer.from === 90)!
    const size = weak.remedies.find(({ kind }) => kind === 'size')!
    expect(size).toMatchObject({ short: 1, crewTime: 540 })
    expect(size.mass).toBeCloseTo(30, 9)
    expect(isAtHand(size)).toBe(false)
    expect(isAtHand(weak.remedies[0]!)).toBe(true)
    expect(weak.remedies.at(-1)!.kind).not.toBe('weigh')
  })

  it('says how much room a larger tube lacks, and lays it nowhere', () => {
    const weak = places(CONTENT, 9).find(({ answer }) => answer.from === 10)!
    const room = weak.remedies.find(({ kind }) => kind === 'room')!
    expect(room.run).toBeNull()
    expect(room.value).toBeCloseTo(0.1, 12)
  })

  it('offers nothing that gains less than 5 mm', () => {
    const gains = places(CONTENT, 18).flatMap(({ remedies }) => remedies.map(({ gain }) => gain))
    expect(gains.every((gain) => gain === null || gain >= 0.005)).toBe(true)
  })

  it('lays a tube where nothing is laid', () => {
    const content = { ...CONTENT, sizes: CONTENT.sizes.slice(1) }
    const [place] = places(content)
    expect(place!.answer.gap).toBe('no-size')
    expect(place!.remedies[0]).toMatchObject({ kind: 'lay', isEnough: true })
    expect(place!.remedies[0]!.run!.barrier.diameter).toBe(0.5)
  })
})

describe('ways past a line', () => {
  const ways = (change: Partial<ScenarioContent> = {}) =>
    waterWays(LINE, { ...CONTENT, ...change }).map(({ kind, standing, flow, shortBy }) => [
      kind,
      standing,
      flow === null ? null : Number(flow.toFixed(4)),
      Number(shortBy.toFixed(3)),
    ])

  // Orifice, C_d 0.6: 0.6 · π 0.15²/4 · √(2 · 9.81 · 0.80) = 0.0420 m³/s, worked by hand.
  it('are the open gully and the well, as long as the water reaches them', () => {
    expect(ways()).toEqual([
      ['gully', 'flows', 0.042, 0],
      ['well', 'flows', 0.0006, 0],
    ])
    expect(ways({ waterLevel: 2.84 })[0]).toEqual(['gully', 'flows', 0.022, 0])
    expect(ways({ waterLevel: 2.6 }).map(([, standing]) => standing)).toEqual(['waits', 'waits'])
  })

  it('are fewer once a pipe is plugged', () => {
    const marks = LOW_ROAD_MARKS.map((mark) => ({ ...mark, state: 'closed' as const }))
    expect(waterWays({ ...LINE, marks }, CONTENT)).toEqual([])
  })

  it('give less against a pond', () => {
    const [, , flow] = ways({ dryLevel: 3.22 })[0]!
    expect(flow).toBeCloseTo(0.021, 3)
  })

  it('name an end that is too low for the freeboard, and one that is open', () => {
    expect(ways({ waterLevel: 3.54 })[2]).toEqual(['ground', 'short', 0, 0.08])
    const open = {
      ...LINE,
      ends: { ...LOW_ROAD_ENDS, start: { ...LOW_ROAD_ENDS.start, kind: 'open' as const } },
    }
    const [first] = waterWays(open, CONTENT)
    expect(first).toMatchObject({ at: 'start', standing: 'flows', flow: null })
    // (2/3)^1.5 √g h^1.5 with h = 0.26 m, worked by hand.
    expect(first!.flowPerMetre).toBeCloseTo(0.226, 3)
  })
})

describe('low spots', () => {
  it('are hollows between rises, not the noise of a survey', () => {
    expect(lowSpots(OFF_THE_GRAVEL_STATIONS).map(({ chainage }) => chainage)).toEqual([45])
  })
})
