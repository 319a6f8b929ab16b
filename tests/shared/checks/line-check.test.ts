import { describe, expect, it } from 'vitest'
import { LOW_ROAD_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { lineSections, groundLevelAt, surfaceAt } from '../../../shared/calc/line/line-sections'
import { lineTurns } from '../../../shared/calc/line/line-turns'
import { BARRIERS } from '../../../shared/catalogue/barriers'
import { GROUNDS } from '../../../shared/catalogue/grounds'
import { checkLine } from '../../../shared/checks/line-check'
import type { Station } from '../../../shared/schemas/line'
import { lineMarkSchema } from '../../../shared/schemas/mark'
import {
  scenarioContentSchema,
  type ScenarioContent,
  type SizeRun,
} from '../../../shared/schemas/scenario'

function run(from: number, to: number, index: number): SizeRun {
  const { id, isExample: _, ...barrier } = BARRIERS[index]!
  return {
    from,
    to,
    barrier: { ...barrier, name: id, catalogueId: id, catalogueRevision: 1 },
    edgeFactor: null,
  }
}

/** The best layout of the demonstration: 4 × 0.50, 9 × 0.70, 5 × 1.00 m; gravel swung onto asphalt. */
const CONTENT: ScenarioContent = scenarioContentSchema.parse({
  waterLevel: 3.42,
  place: 60,
  sizes: [run(0, 20, 0), run(20, 40, 1), run(40, 90, 2), run(90, 160, 1), run(160, 180, 0)],
  grounds: GROUNDS.map(({ id, friction, isSuitable }) => ({
    surface: id,
    friction,
    suitable: isSuitable,
  })),
})

const SWUNG: readonly Station[] = LOW_ROAD_STATIONS.map((station) =>
  station.surface === 'loose-gravel'
    ? { ...station, surface: 'asphalt', groundLevel: 2.97 }
    : station,
)

const survey = (stations: readonly Station[]) => ({ stations, sectionLength: 10 })
const turnAt = (chainage: number) =>
  lineTurns(SWUNG).find((turn) => turn.chainage === chainage)!.angle

describe('sections of a line', () => {
  it('turn at marks where x and y are not known', () => {
    const straight = LOW_ROAD_STATIONS.map((station) => ({ ...station, x: null, y: null }))
    const turn = lineMarkSchema.parse({ kind: 'turn', chainage: 63, angle: 1 })
    expect(lineTurns(straight, [turn])).toEqual([{ chainage: 63, angle: 1 }])
    expect(lineTurns(LOW_ROAD_STATIONS, [turn])).toHaveLength(4)
    const sections = lineSections(straight, 10, [turn])
    expect(sections.filter(({ turnAtEnd }) => turnAtEnd === 1)).toMatchObject([{ to: 63 }])
    expect(sections.filter(({ turnAtStart }) => turnAtStart === 1)).toMatchObject([{ from: 63 }])
  })

  it('are bounded by turns of 5° and more and laid from the lower chainage', () => {
    const turns = lineTurns(LOW_ROAD_STATIONS)
    expect(turns.map(({ chainage }) => chainage)).toEqual([40, 60, 120, 150])
    const degrees = turns.map(({ angle }) => Math.round((angle * 180) / Math.PI))
    expect(degrees).toEqual([-20, 90, 35, 25])
    const sections = lineSections(LOW_ROAD_STATIONS, 10)
    expect(sections).toHaveLength(18)
    expect(sections.map(({ from }) => from)).toEqual(Array.from({ length: 18 }, (_, i) => 10 * i))
  })

  it('have a shorter last one where a run is no multiple of the length', () => {
    const sections = lineSections(LOW_ROAD_STATIONS, 7)
    expect(sections.find(({ to }) => to === 40)).toMatchObject({ from: 35 })
    expect(sections[0]).toMatchObject({ from: 0, to: 7 })
  })

  it('are cut into pieces of one surface, each with its lowest ground', () => {
    const section = lineSections(LOW_ROAD_STATIONS, 10).find(({ from }) => from === 140)!
    expect(section.pieces).toEqual([
      { from: 140, to: 142, surface: 'asphalt', lowestGround: 2.98, lowestAt: 140 },
      { from: 142, to: 148, surface: 'loose-gravel', lowestGround: 2.97, lowestAt: 145 },
      { from: 148, to: 150, surface: 'turf', lowestGround: 2.99, lowestAt: 148 },
    ])
    const lowest = lineSections(LOW_ROAD_STATIONS, 10).find(({ from }) => from === 40)!
    expect(lowest).toMatchObject({ clearWidth: 6, pieces: [{ lowestGround: 2.79, lowestAt: 45 }] })
  })

  it('are one where there is one station', () => {
    const station = { ...LOW_ROAD_STATIONS[7]!, chainage: 0, x: null, y: null }
    expect(lineSections([station], 10)).toEqual([
      {
        from: 0,
        to: 10,
        clearWidth: 5,
        turnAtStart: 0,
        turnAtEnd: 0,
        pieces: [{ from: 0, to: 10, surface: 'turf', lowestGround: 2.87, lowestAt: 0 }],
      },
    ])
  })

  it('know ground and surface anywhere', () => {
    expect(groundLevelAt(LOW_ROAD_STATIONS, 42.5)).toBeCloseTo(2.91, 12)
    expect(groundLevelAt(LOW_ROAD_STATIONS, -5)).toBe(3.16)
    expect(groundLevelAt(LOW_ROAD_STATIONS, 500)).toBe(3.56)
    expect(surfaceAt(LOW_ROAD_STATIONS, 144)).toBe('loose-gravel')
    expect(surfaceAt(LOW_ROAD_STATIONS, 0)).toBe('concrete')
  })
})

describe('check of a line', () => {
  // Without x and y no turn is known; its sections are the same, because each run is a multiple of 10 m.
  const straight = SWUNG.map((station) => ({ ...station, x: null, y: null }))
  const answer = checkLine(survey(straight), CONTENT)
  const at = (chainage: number) => answer.sections.find(({ from }) => from === chainage)!
  const used = (chainage: number): number => Math.round(100 * at(chainage).utilisation!)

  // Figures of an independent program for the same rules, without skirt missing at bends.
  it('gives way first at the slipway', () => {
    expect(answer.verdict).toBe('fails')
    expect(answer.weakest).toMatchObject({ from: 40, to: 50, place: 45, limitedBy: 'sliding' })
    expect(Math.floor(answer.weakest.holdsToLevel! * 1000) / 1000).toBe(3.403)
    expect(at(40).depth).toBeCloseTo(0.63, 12)
    expect(used(40)).toBe(103)
    expect(at(40).verdict).toBe('fails')
  })

  it('holds narrowly on turf and at the quay', () => {
    for (const chainage of [90, 100, 110]) {
      expect(at(chainage).verdict).toBe('narrow')
      expect(used(chainage)).toBeGreaterThanOrEqual(96)
      expect(used(chainage)).toBeLessThanOrEqual(98)
    }
    for (const chainage of [10, 50]) {
      expect(at(chainage).verdict).toBe('narrow')
      expect([93, 94]).toContain(used(chainage))
    }
    expect(at(150).verdict).toBe('holds')
  })

  // Figures of the same independent program, with skirt missing at bends.
  it('loses grip beside a turn away from the water', () => {
    const bent = checkLine(survey(SWUNG), CONTENT)
    const used = (from: number) =>
      Math.round(100 * bent.sections.find((section) => section.from === from)!.utilisation!)
    expect([used(50), used(60), used(110)]).toEqual([107, 90, 99])
    expect(bent.sections.find(({ from }) => from === 50)!.gripShare).toBeCloseTo(
      1 - (3.1 * turnAt(60)) / 40,
      12,
    )
    expect(bent.sections.find(({ from }) => from === 40)!.gripShare).toBe(1)
    expect(bent.weakest).toMatchObject({ from: 50, limitedBy: 'sliding' })
  })

  it('cannot be joined at a turn sharper than a joint takes', () => {
    const stations = [0, 10, 20].map((chainage, i) => ({
      ...SWUNG[0]!,
      chainage,
      x: [0, 10, 5][i]!,
      y: [0, 0, 8.66][i]!,
    }))
    const { sections, verdict } = checkLine(survey(stations), CONTENT)
    expect(sections.map(({ gap }) => gap)).toEqual(['sharp-turn', 'sharp-turn'])
    expect(verdict).toBe('fails')
  })

  it('never holds on loose gravel', () => {
    const onGravel = checkLine(survey(LOW_ROAD_STATIONS), CONTENT)
    const section = onGravel.sections.find(({ from }) => from === 140)!
    expect(section).toMatchObject({ verdict: 'fails', governs: 'ground', holdsToLevel: null })
    expect(onGravel.weakest.from).toBe(140)
  })

  it('does not rely on a section without size or known ground', () => {
    const gaps = checkLine(survey(SWUNG), { ...CONTENT, sizes: CONTENT.sizes.slice(1) })
    expect(gaps.sections[0]).toMatchObject({ gap: 'no-size', verdict: 'notChecked' })
    const bare = {
      ...CONTENT,
      grounds: CONTENT.grounds.filter(({ surface }) => surface !== 'turf'),
    }
    expect(checkLine(survey(SWUNG), bare).sections[6]).toMatchObject({ gap: 'no-ground' })
  })

  it('computes no case under more than 1.5 diameters of water', () => {
    const deep = checkLine(survey(SWUNG), { ...CONTENT, waterLevel: 4.6 })
    expect(deep.sections[0]).toMatchObject({ gap: 'too-deep', verdict: 'fails' })
  })
})
