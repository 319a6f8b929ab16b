import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkLine } from '../../../shared/checks/line-check'
import type { ScenarioContent } from '../../../shared/schemas/scenario'
import { scenarioFaults } from '../../../shared/schemas/scenario-faults'
import { LOW_ROAD_SURVEY, lowRoadContent, sizeRun } from '../../support/ferry-quay'

const faultsOf = (changes: Partial<ScenarioContent>) =>
  scenarioFaults(lowRoadContent(changes), LOW_ROAD_SURVEY)
const [run] = lowRoadContent().sizes
const { grounds, uplift, water } = lowRoadContent()

describe('faults of a scenario', () => {
  it('are none where everything lies in its range', () => {
    expect(faultsOf({})).toEqual([])
  })

  it('are none where sizes leave a gap: that is an answer', () => {
    expect(faultsOf({ sizes: [sizeRun(0, 20)] })).toEqual([])
  })

  const barrier = { ...run!.barrier, diameter: 700 }
  it.each<[string, Partial<ScenarioContent>, string]>([
    [
      'millimetres in a size',
      { sizes: [run!, { ...run!, barrier }] },
      'content.sizes[1].barrier.diameter',
    ],
    [
      'a friction of 5',
      { grounds: [grounds[0]!, { ...grounds[1]!, friction: 5 }, ...grounds.slice(2)] },
      'content.grounds[1].friction',
    ],
    ['an edge above 1', { uplift: { ...uplift, edgeFactor: 2 } }, 'content.uplift.edgeFactor'],
    ['an edge of a size', { sizes: [{ ...run!, edgeFactor: 2 }] }, 'content.sizes[0].edgeFactor'],
    ['waves without a period', { water: { ...water, waveHeight: 1 } }, 'content.water.wavePeriod'],
    ['a steep fall', { fall: 1 }, 'content.fall'],
    ['a level in millimetres', { waterLevel: 34_200 }, 'content.waterLevel'],
    ['a place beyond the line', { place: 181 }, 'content.place'],
    ['a run that goes down', { sizes: [sizeRun(40, 20)] }, 'content.sizes[0].to'],
    ['a run of no length', { sizes: [sizeRun(40, 40)] }, 'content.sizes[0].to'],
    [
      'a surface assumed twice',
      { grounds: [...grounds, grounds[0]!] },
      'content.grounds[5].surface',
    ],
    ['a rise in metres an hour', { rateOfRise: 0.13 }, 'content.rateOfRise'],
    ['a time below zero', { timeToClear: -1 }, 'content.timeToClear'],
  ])('name %s', (_what, changes, path) => {
    const faults = faultsOf(changes)
    expect(faults.map((fault) => fault.path)).toEqual([path])
    expect(faults[0]!.message.startsWith(`${path}: `)).toBe(true)
  })

  it('name a surface of the line of which nothing is assumed', () => {
    const faults = faultsOf({ grounds: grounds.filter(({ surface }) => surface !== 'asphalt') })
    expect(faults).toHaveLength(1)
    expect(faults[0]).toMatchObject({ path: 'content.grounds' })
    expect(faults[0]!.message).toContain('"asphalt"')
  })

  it('bound water on the dry side by the lowest place', () => {
    // Lowest ground 2.79 and tube 0.70 m: 2.79 + 1.5 × 0.70 = 3.84.
    expect(faultsOf({ dryLevel: 3.84 })).toEqual([])
    expect(faultsOf({ dryLevel: 3.85 })).toMatchObject([
      { path: 'content.dryLevel', allowed: '-500 to 3.84 m' },
    ])
  })

  it('leave nothing that the engine cannot answer', { timeout: 30_000 }, () => {
    /** Mostly inside the range, now and then far outside. */
    const number = (min: number, max: number) =>
      fc.oneof(
        { weight: 20, arbitrary: fc.double({ min, max, noNaN: true }) },
        { weight: 1, arbitrary: fc.constantFrom(-1, 1e-9, 1e9) },
      )
    let answered = 0
    fc.assert(
      fc.property(
        fc.record({
          waterLevel: number(2, 6),
          dryLevel: fc.option(number(2, 3)),
          requiredFreeboard: number(0, 2),
          fall: number(-0.1, 0.1),
          diameter: number(0.2, 3),
          skirtLength: number(0, 15),
          from: number(0, 15),
          to: fc.constantFrom(20, 180),
        }),
        ({ diameter, skirtLength, from, to, ...changes }) => {
          const size = sizeRun(from, to)
          const sizes = [{ ...size, barrier: { ...size.barrier, diameter, skirtLength } }]
          const content = lowRoadContent({ ...changes, sizes })
          if (scenarioFaults(content, LOW_ROAD_SURVEY).length > 0) return
          const answer = checkLine(LOW_ROAD_SURVEY, content)
          expect(answer.sections).toHaveLength(18)
          answered += 1
          const levels = answer.sections.flatMap(({ holdsToLevel }) => holdsToLevel ?? [])
          expect(levels.every(Number.isFinite)).toBe(true)
        },
      ),
      { numRuns: 30 },
    )
    expect(answered).toBeGreaterThan(8)
  })
})
