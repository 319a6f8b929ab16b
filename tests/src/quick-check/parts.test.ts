import { describe, expect, it } from 'vitest'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { textResolver } from '../../../shared/texts/format-text'
import { texts } from '../../../shared/texts'
import { sectionDetails } from '../../../shared/texts/section-details.en'
import { actingWater } from '../../../src/quick-check/acting-water'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import { sectionCase, type FieldValues } from '../../../src/quick-check/case-input'
import { FIELD_IDS, fieldOf } from '../../../src/quick-check/fields'
import { INITIAL_CHOICES, type Choices } from '../../../src/quick-check/choices'
import { PART_ANSWERS } from '../../../src/quick-check/parts/answers'
import { PART_DETAILS } from '../../../src/quick-check/parts/details'
import { frontPart } from '../../../src/quick-check/parts/front-part'
import { PART_IDS, type PartId, type PartInput } from '../../../src/quick-check/parts/part'
import { PART_FIELDS } from '../../../src/quick-check/parts/part-fields'

const say = textResolver(sectionDetails.en, 'metric')
const plain = (text: string) => text.replace(/[\u00a0\u202f]/g, ' ')

function given(change: Partial<FieldValues> = {}, choices: Partial<Choices> = {}): PartInput {
  const values = { ...INITIAL_VALUES, ...change }
  const section = sectionCase({ values, choices: { ...INITIAL_CHOICES, ...choices } })
  return { section, evaluation: evaluateSection(section), values }
}

const answer = (id: PartId, change: Partial<FieldValues> = {}) =>
  plain(say(PART_ANSWERS[id](given(change))))

/** Figures of an opened part, by their names. */
function figures(id: PartId, change: Partial<FieldValues>): Record<string, string> {
  const rows = PART_DETAILS[id](given(change)).flatMap((group) => group.rows)
  return Object.fromEntries(rows.map(({ name, value }) => [say(name), plain(say(value))]))
}

const notes = (id: PartId, change: Partial<FieldValues>) =>
  PART_DETAILS[id](given(change)).flatMap((group) => group.notes.map(say))

describe('a part, folded', () => {
  it('answers in one line where nothing acts', () => {
    expect(answer('waves')).toBe('none')
    expect(answer('current')).toBe('none')
    expect(answer('debris')).toBe('none')
    expect(answer('bends')).toBe('straight')
    expect(answer('dry')).toBe('no water standing, nothing over the crest')
    // ρ g h = 1000 × 9.81 × 0.42 = 4120 Pa; 15 kPa at 12 °C are 10.1 kPa at 0 °C (Gay-Lussac).
    expect(answer('air')).toBe('15.0 kPa of 4.2 kPa; coldest hour 10.1 kPa, enough')
    expect(answer('edge')).toMatch(/^100 % open: 4\.78 kN\/m under the skirt/)
  })

  it('says what acts', () => {
    expect(answer('debris', { debrisForce: 2000 })).toBe('2.00 kN on one section, 0.20 kN/m')
    expect(answer('debris', { debrisForce: 2000, depth: 0.2 })).toContain('does not reach')
    expect(answer('waves', { waveHeight: 0.1, wavePeriod: 2 })).toMatch(/of thrust$/)
    expect(answer('air', { filledAt: 40, coldest: -15 })).toContain('limp')
    expect(answer('dry', { depth: 0.8 })).toMatch(/^overtopped: at least/)
    expect(answer('bends', { turn: -0.5 })).toContain('folds the skirt')
  })
})

describe('the part that governs', () => {
  const front = (change: Partial<FieldValues>) => frontPart(given(change))

  it('is none while the case holds with room to spare', () => {
    expect(front({})).toBeNull()
    expect(front({ depth: 0.35, debrisForce: 100 })).toBeNull()
  })

  it('is the load without which most would be left', () => {
    expect(front({ waveHeight: 0.1, wavePeriod: 2 })).toBe('waves')
    expect(front({ debrisForce: 8000 })).toBe('debris')
    expect(front({ currentSpeed: 2 })).toBe('current')
    expect(front({ dryDepth: 0.12 })).toBe('dry')
    expect(front({ debrisForce: 9000, waveHeight: 0.02, wavePeriod: 2 })).toBe('debris')
  })

  it('is the edge where still water alone is too much', () => {
    expect(front({ depth: 0.55 })).toBe('edge')
  })

  it('is the air where the night takes the answer away, and where the tube gives way', () => {
    expect(front({ filledAt: 40, coldest: -15 })).toBe('air')
    expect(front({ airPressure: 900, edgeFactor: 0 })).toBe('air')
  })

  it('is the air where the checks are met and a leaking skirt would take the seat', () => {
    const pond = { depth: 0.2, dryDepth: 0.06 }
    expect(given(pond).evaluation.verdict).toBe('holds')
    expect(front(pond)).toBe('air')
    expect(answer('air', pond)).toContain('lets the tube give way')
    expect(notes('air', pond).join(' ')).toContain('although the checks are met')
    expect(front({ ...pond, dryDepth: 0 })).toBeNull()
  })

  it('is the bend where both sections beside it fail and the straight line holds', () => {
    expect(front({ depth: 0.485, turn: 1.4 })).not.toBe('bends')
    expect(front({ depth: 0.45, requiredFreeboard: 0.1, turn: 1.5, sectionLength: 3 })).toBe('edge')
    expect(front({ depth: 0.4, turn: 1.5, sectionLength: 3 })).toBe('bends')
  })

  it('is none without a skirt', () => {
    expect(front({ skirtLength: 0, waveHeight: 0.1, wavePeriod: 2 })).toBeNull()
  })
})

describe('what moves in the water', () => {
  const acting = (change: Partial<FieldValues>) =>
    actingWater(given(change).section).map(({ key, values }) =>
      plain(textResolver(texts.en, 'metric')(values ? { key, values } : { key })),
    )

  it('is told in a line while its inputs are folded', () => {
    expect(acting({})).toEqual(['none'])
    expect(acting({ currentSpeed: 0.5, debrisForce: 2000 })).toEqual([
      'current 0.50 m/s',
      'debris 2.00 kN',
    ])
    expect(acting({ waveHeight: 0.1, wavePeriod: 2 })).toEqual(['waves 0.100 m'])
  })

  it('leads from each part to the first of its inputs', () => {
    const first = (id: PartId) => PART_DETAILS[id](given())[0]!.entered?.field
    expect([first('waves'), first('current'), first('debris')]).toEqual([
      'waveHeight',
      'currentSpeed',
      'debrisForce',
    ])
  })
})

describe('an opened part', () => {
  it('grows waves from wind and fetch, and puts them into the case', () => {
    // Shore Protection Manual 1984 (from memory), computed by hand: U_A = 0.71 × 20^1.23 = 28.28 m/s.
    const change = { windSpeed: 20, fetch: 3000, fetchDepth: 3 }
    const group = PART_DETAILS.waves(given(change))[1]!
    expect(figures('waves', change)).toEqual({
      'Significant wave height': '0.664 m',
      'Significant period': '2.5 s',
    })
    expect(group.proposal!.values.waveHeight).toBeCloseTo(0.664, 3)
    expect(group.notes.map(say)).toContain('Methods differ by ±25 %.')
  })

  it('finds a debris force by impulse and momentum', () => {
    // Newton: 500 kg × 1 m/s / 0.1 s = 5 kN; a half sine of the same impulse peaks at π/2 of it.
    const change = { debrisMass: 500, debrisSpeed: 1, debrisStop: 0.1 }
    expect(figures('debris', change)).toEqual({
      'Mean force, m v/t': '5.00 kN',
      'Highest force, half sine': '7.86 kN',
    })
    const force = PART_DETAILS.debris(given(change))[1]!.proposal!.values.debrisForce
    expect(force).toBe(7854)
  })

  it('tells the leak of linked sections, and says so where a reading rises', () => {
    const drop = { dropFrom: 15_000, dropTo: 14_000, dropTime: 3600, linkedSections: 4 }
    const said = figures('air', drop)
    // √p falls evenly: after 10 h √15000 − 10 (√15000 − √14000) = 80.9, squared 6.55 kPa.
    expect(said['Pressure after that time']).toBe('6.5 kPa')
    expect(said['Volume of air']).toBe('15.4 m³')
    const duty = { ...drop, compressorFlow: 5e-4, startPressure: 16_000, stopPressure: 13_000 }
    expect(figures('air', duty)['Compressor runs']).toMatch(/^must start below/)
    const tiny = { ...drop, compressorFlow: 1e-6, startPressure: 13_000, stopPressure: 16_000 }
    expect(figures('air', tiny)['Compressor runs']).toMatch(/^too small/)
    expect(notes('air', { ...drop, dropTo: 15_500 }).join(' ')).toContain('pressure rises')
  })

  it('says what the seat bears beside what the uplift model has there', () => {
    const said = figures('air', {})
    expect(said['Pressure under the lifted skirt that the seat bears']).toMatch(/kPa$/)
    expect(notes('air', {}).join(' ')).toContain('drained')
  })

  it('says what comes over the crest, and what it means', () => {
    const waves = { waveHeight: 0.2, wavePeriod: 3, depth: 0.5, edgeFactor: 0 }
    expect(Object.keys(figures('dry', waves))).toContain('Thrown over, mean')
    expect(notes('dry', { depth: 0.9 }).join(' ')).toContain('Nobody may stand behind it')
    expect(figures('dry', {})['Every check is met up to']).toMatch(/^0\.0\d\d m$/)
  })

  it('shares what a bend takes, and only away from the water', () => {
    const said = figures('bends', { turn: Math.PI / 6 })
    // Sector ½ × 2.2² × π/6 = 1.27 m²; each of two sections of 10 m loses 1.27/(2 × 2.2 × 10) = 2.9 %.
    expect(said['Skirt that is missing']).toBe('1.27 m²')
    expect(said['Lost by each of both sections']).toBe('3 %')
    expect(figures('bends', { turn: -Math.PI / 6 })['Skirt that is missing']).toBeUndefined()
  })

  it('weighs the edge against a current along the line', () => {
    // ½ × 1000 × 1² × 0.3 / (9.81 × ½) = 30.6 kg/m.
    expect(figures('edge', { edgeCurrent: 1 })['Ballast on the wet edge']).toBe('30.6 kg/m')
  })

  it('never shows NaN, whatever stands in its fields', () => {
    for (const depth of [0, 0.42, 1.05]) {
      for (const skirtLength of [0, 0.3]) {
        const input = given({ depth, skirtLength, waveHeight: 0.1, wavePeriod: 2, turn: 0.4 })
        for (const id of PART_IDS) {
          const groups = PART_DETAILS[id](input)
          const words = [PART_ANSWERS[id](input), ...groups.flatMap((group) => group.notes)]
          const values = groups.flatMap((group) => group.rows.map(({ value }) => value))
          expect([...words, ...values].map(say).join(' ')).not.toMatch(
            /NaN|Infinity|sectionDetails/,
          )
        }
      }
    }
  })
})

it('gives every input of a part its place; none of them touches the verdict', () => {
  const own = Object.values(PART_FIELDS).flat()
  const shown = PART_IDS.flatMap((id) => PART_DETAILS[id](given()).flatMap(({ fields }) => fields))
  expect([...shown].sort()).toEqual([...own].sort())
  expect(own.every((id) => fieldOf(id).group === 'before')).toBe(true)
  expect(FIELD_IDS).toEqual(expect.arrayContaining([...own]))
})
