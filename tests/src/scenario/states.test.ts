import { describe, expect, it } from 'vitest'
import { BARRIERS } from '../../../shared/catalogue/barriers'
import type { CaseInput } from '../../../src/quick-check/case-input'
import { disagreements, mergedState, reasonablePicks } from '../../../src/scenario/merge-states'
import { contentOfCase, lineOfCase } from '../../../src/scenario/content-of-case'
import { newContent } from '../../../src/scenario/new-content'
import { inputAtPlace, withInputAtPlace } from '../../../src/scenario/place-input'
import { placeOnLine } from '../../../src/scenario/place-on-line'
import { checkedPlace, gapAt } from '../../../src/scenario/checked-place'
import { differingFields } from '../../../src/scenario/scenario-fields'
import type { ScenarioState } from '../../../src/scenario/scenario-state'
import { withCatalogueTube } from '../../../src/scenario/size-runs'
import { tubeBook } from '../../../src/scenario/tube-book'
import { readAddress } from '../../../src/quick-check/address'
import { sectionCase } from '../../../src/quick-check/case-input'
import { assumptionOf, caseAt } from '../../../shared/checks/place-case'
import { scenarioContentSchema } from '../../../shared/schemas/scenario'
import { scenarioFaults } from '../../../shared/schemas/scenario-faults'
import { LOW_ROAD_SURVEY, lowRoadContent, sizeRun } from '../../support/ferry-quay'

const name = (diameter: number) => `Tube ${diameter.toFixed(2)} m`
const entries = BARRIERS.map((tube) => ({ ...tube, source: 'Example', revision: 3 }))
const tubes = tubeBook(name, { barriers: entries })
const base: ScenarioState = { name: 'Tonight', note: '', content: lowRoadContent() }
const withContent = (change: Partial<ScenarioState['content']>): ScenarioState => ({
  ...base,
  content: { ...base.content, ...change },
})
const withFriction = (state: ScenarioState, surface: string, friction: number): ScenarioState => ({
  ...state,
  content: {
    ...state.content,
    grounds: state.content.grounds.map((ground) =>
      ground.surface === surface ? { ...ground, friction } : ground,
    ),
  },
})

describe('two versions made on the same one', () => {
  const mine = { ...withContent({ waterLevel: 3.3, fall: 0.01 }), note: 'mine' }
  const theirs = withFriction(withContent({ waterLevel: 3.5 }), 'turf', 0.3)
  const collision = { mine, theirs, base }
  const found = disagreements(collision)
  const sides = Object.fromEntries(found.map(({ field, changedBy }) => [field.id, changedBy]))

  it('differ field by field, and each says whose change it is', () => {
    expect(sides).toEqual({
      note: 'mine',
      'content.waterLevel': 'both',
      'content.fall': 'mine',
      'grounds.turf.friction': 'theirs',
    })
  })

  it('ask only for what both changed', () => {
    expect(reasonablePicks(found)).toMatchObject({
      note: 'mine',
      'content.waterLevel': null,
      'grounds.turf.friction': 'theirs',
    })
  })

  it('come together with nothing lost that was picked', () => {
    const picks = { ...reasonablePicks(found), 'content.waterLevel': 'theirs' as const }
    const merged = mergedState(collision, found, picks)
    expect(merged).toEqual({
      ...withFriction(withContent({ waterLevel: 3.5, fall: 0.01 }), 'turf', 0.3),
      note: 'mine',
    })
  })

  it('become the other one where everything of it is picked', () => {
    const all = Object.fromEntries(found.map(({ field }) => [field.id, 'theirs' as const]))
    expect(mergedState(collision, found, all)).toEqual(theirs)
  })

  it('are decided field by field where the version before is not known', () => {
    const unknown = disagreements({ mine, theirs, base: null })
    expect(unknown.every(({ changedBy }) => changedBy === 'both')).toBe(true)
  })

  it('take a surface that only one of them assumes as a whole', () => {
    const fewer = withContent({ grounds: base.content.grounds.slice(0, 1) })
    const missing = disagreements({ mine: fewer, theirs: base, base })
    const all = Object.fromEntries(missing.map(({ field }) => [field.id, 'theirs' as const]))
    const merged = mergedState({ mine: fewer, theirs: base, base }, missing, all)
    expect(differingFields(merged, base)).toEqual([])
  })

  it('do not differ by the place that each looks at', () => {
    expect(differingFields(base, withContent({ place: 90 }))).toEqual([])
  })
})

describe('a scenario at a place', () => {
  const content = lowRoadContent({
    sizes: [sizeRun(0, 180), { ...sizeRun(40, 60, 2), edgeFactor: 0.5 }],
  })
  const at = (chainage: number, of = content) => placeOnLine(LOW_ROAD_SURVEY, of, chainage)

  it('is the very case that the check of the line asks', () => {
    const place = at(45)
    expect(place).toMatchObject({ groundLevel: 2.79, surface: 'concrete', runIndex: 1 })
    const ground = assumptionOf(content, 'concrete')!
    expect(checkedPlace(content, place)?.section).toEqual(
      caseAt(content, place, place.run!, ground),
    )
  })

  it('belongs to the section that begins there, unless the other one is named', () => {
    expect(at(60).section).toEqual({ from: 60, to: 70 })
    const before = placeOnLine(LOW_ROAD_SURVEY, content, 60, { from: 50, to: 60 })
    expect(before).toMatchObject({ section: { from: 50, to: 60 }, surface: 'concrete' })
  })

  it('says what keeps it from being checked', () => {
    expect(gapAt(at(45, { ...content, sizes: [sizeRun(100, 180)] }))).toBe('no-size')
    expect(gapAt(at(45, { ...content, grounds: [content.grounds[0]!] }))).toBe('no-ground')
    expect(gapAt(at(45))).toBeNull()
  })

  it('changes nothing where nothing was changed in the panels', () => {
    const place = at(45)
    expect(withInputAtPlace(content, place, inputAtPlace(content, place), tubes)).toBe(content)
  })

  it.each([
    ['friction', 0.31, 'grounds[1].friction'],
    ['fall', 0.02, 'fall'],
    ['currentSpeed', 0.5, 'water.currentSpeed'],
    ['debrisForce', 900, 'debris.force'],
    ['rateOfRise', 1e-5, 'rateOfRise'],
    ['requiredFreeboard', 0.2, 'requiredFreeboard'],
    ['airPressure', 16_000, 'sizes[1].barrier.airPressure'],
  ] as const)('keeps %s where it belongs and nowhere else', (field, value, path) => {
    const place = at(45)
    const input = inputAtPlace(content, place)
    const next = withInputAtPlace(content, place, change(input, { [field]: value }), tubes)
    const parts = path.split(/[.[\]]+/).filter(Boolean)
    const read = (of: unknown) =>
      parts.reduce<unknown>((node, key) => (node as Record<string, unknown>)[key], of)
    expect(read(next)).toBe(value)
    expect(inputAtPlace(next, place.run ? at(45, next) : place).values[field]).toBe(value)
    expect(scenarioContentSchema.safeParse(next).success).toBe(true)
  })

  it('changes the edge of its own run, else that of the line', () => {
    const own = withInputAtPlace(
      content,
      at(45),
      change(inputAtPlace(content, at(45)), { edgeFactor: 0.2 }),
      tubes,
    )
    expect(own.sizes[1]?.edgeFactor).toBe(0.2)
    expect(own.uplift.edgeFactor).toBe(1)
    const rest = withInputAtPlace(
      content,
      at(20),
      change(inputAtPlace(content, at(20)), { edgeFactor: 0.2 }),
      tubes,
    )
    expect(rest.uplift.edgeFactor).toBe(0.2)
    expect(rest.sizes).toEqual(content.sizes)
  })

  it('calls a tube after the catalogue only as long as its figures are those of the catalogue', () => {
    const place = at(20)
    const own = withInputAtPlace(
      content,
      place,
      change(inputAtPlace(content, place), { diameter: 0.8 }),
      tubes,
    )
    expect(own.sizes[0]?.barrier).toMatchObject({ name: 'Tube 0.80 m', catalogueId: null })
    const back = withInputAtPlace(own, at(20, own), inputAtPlace(content, place), tubes)
    expect(back.sizes[0]?.barrier).toMatchObject({ name: 'Tube 0.70 m', catalogueId: 'tube-0.70' })
    expect(own.sizes[0]?.barrier.catalogueRevision).toBeNull()
    expect(back.sizes[0]?.barrier.catalogueRevision).toBe(3)
  })

  it('keeps the revision that a tube came with, and notes that of a tube newly chosen', () => {
    const chosen = withCatalogueTube(content.sizes, 0, 'tube-1.00', tubes)
    expect(chosen.map(({ barrier }) => barrier.catalogueRevision)).toEqual([
      3,
      ...content.sizes.slice(1).map(() => 1),
    ])
    const place = at(45)
    const next = withInputAtPlace(
      content,
      place,
      change(inputAtPlace(content, place), { edgeFactor: 0.2 }),
      tubes,
    )
    expect(next.sizes[1]?.barrier.catalogueRevision).toBe(1)
  })

  it('notes no revision where the catalogue has other figures, or has not answered', () => {
    const heavier = entries.map((tube) => ({ ...tube, mass: tube.mass + 1 }))
    for (const catalogue of [{ barriers: heavier }, undefined]) {
      const made = newContent(LOW_ROAD_SURVEY, tubeBook(name, catalogue))
      expect(made.sizes[0]?.barrier).toMatchObject({
        catalogueId: 'tube-0.70',
        catalogueRevision: null,
      })
    }
  })
})

describe('a new scenario', () => {
  it('can be computed on the line and begins at its lowest ground', () => {
    const content = newContent(LOW_ROAD_SURVEY, tubes)
    expect(scenarioContentSchema.parse(content)).toEqual(content)
    expect(scenarioFaults(content, LOW_ROAD_SURVEY)).toEqual([])
    expect(content).toMatchObject({ place: 45, waterLevel: 3.21 })
  })

  it('made of a Quick check asks the same case at its place', () => {
    const input = readAddress(
      'v=1&water=level&level=3.35&groundlevel=2.87&friction=0.41&drydepth=0.1&wave=0.1&period=3',
    )
    const line = lineOfCase(input, 2.87)
    const content = contentOfCase(input, line, tubes)
    expect(scenarioContentSchema.parse(content)).toEqual(content)
    const section = checkedPlace(content, placeOnLine(line, content, 0))!.section
    const wanted = sectionCase(input)
    expect(section.water.depth).toBeCloseTo(wanted.water.depth, 9)
    expect(section.water.dryDepth).toBeCloseTo(wanted.water.dryDepth, 9)
    expect({ ...section, water: 0 }).toEqual({ ...wanted, water: 0 })
    expect({ ...section.water, depth: 0, dryDepth: 0 }).toEqual({
      ...wanted.water,
      depth: 0,
      dryDepth: 0,
    })
  })

  it('made of a depth counts it at the lowest ground of the line', () => {
    const content = contentOfCase(readAddress('v=1&depth=0.5'), LOW_ROAD_SURVEY, tubes)
    expect(content.waterLevel).toBe(3.29)
    expect(content.grounds.map(({ surface }) => surface).sort()).toEqual([
      'asphalt',
      'concrete',
      'loose-gravel',
      'turf',
    ])
  })
})

function change(input: CaseInput, values: Partial<CaseInput['values']>): CaseInput {
  return { ...input, values: { ...input.values, ...values } }
}
