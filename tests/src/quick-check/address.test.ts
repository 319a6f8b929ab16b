import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  INITIAL_VALUES,
  readAddress,
  writeAddress,
  type AddressContent,
} from '../../../src/quick-check/address'
import { CHOICE_IDS, CHOICES, INITIAL_CHOICES } from '../../../src/quick-check/choices'
import { isInUse } from '../../../src/quick-check/field-faults'
import { FIELD_IDS, fieldOf, type FieldId } from '../../../src/quick-check/fields'

const START: AddressContent = { values: INITIAL_VALUES, choices: INITIAL_CHOICES, refused: {} }

const figure = fc.double({ noNaN: true, noDefaultInfinity: true }).map((value) => value + 0)

const anyContent: fc.Arbitrary<AddressContent> = fc
  .record({
    values: fc.record(
      Object.fromEntries(
        FIELD_IDS.map((id) => [id, fieldOf(id).isOptional ? fc.option(figure) : figure]),
      ) as Record<FieldId, fc.Arbitrary<number | null>>,
    ),
    choices: fc.record(
      Object.fromEntries(
        CHOICE_IDS.map((id) => [id, fc.constantFrom<string[]>(...CHOICES[id].options)]),
      ) as Record<keyof typeof CHOICES, fc.Arbitrary<string>>,
    ),
    refused: fc.dictionary(
      fc.constantFrom(...FIELD_IDS),
      fc.oneof(
        figure,
        fc.constantFrom('', 'knee-deep', '0.42 m', '1e309', 'NaN', 'a&b=c+d %', '−', 'depth'),
      ),
    ),
  })
  .map((content) => content as unknown as AddressContent)

/** A field that the chosen way of entering leaves out is not told: it comes back at its default. */
function told({ values, choices, refused }: AddressContent): AddressContent {
  const kept = FIELD_IDS.map((id) => [id, isInUse(id, choices) ? values[id] : INITIAL_VALUES[id]])
  return { values: Object.fromEntries(kept) as AddressContent['values'], choices, refused }
}

describe('the address', () => {
  it('brings back whatever it was given', () => {
    fc.assert(
      fc.property(anyContent, (content) => {
        const { problems, ...read } = readAddress(writeAddress(content))
        expect(problems).toEqual([])
        expect(read).toEqual(told(content))
      }),
    )
  })

  it('carries the version and what an answer rests on, also for the default case', () => {
    expect(writeAddress(START)).toBe(
      'v=1&basis=global-1.5&surface=turf&depth=0.42&diameter=0.7&skirt=2.2&strip=0.12' +
        '&mass=4.8&air=15000&friction=0.45&edge=1',
    )
  })

  it('gives a key to every field and choice, and no key twice', () => {
    const keys = [
      ...FIELD_IDS.map((id) => fieldOf(id).key),
      ...CHOICE_IDS.map((id) => CHOICES[id].key),
    ]
    expect(new Set(keys).size).toBe(keys.length)
    expect(keys).not.toContain('v')
  })

  it.each([
    ['colour=red', { reason: 'unknownKey', key: 'colour', value: 'red' }],
    ['depth=0%2C42', { reason: 'notAFigure', key: 'depth', value: '0,42' }],
    ['depth=', { reason: 'notAFigure', key: 'depth', value: '' }],
    ['mass=1e309', { reason: 'notAFigure', key: 'mass', value: '1e309' }],
    ['mass=NaN', { reason: 'notAFigure', key: 'mass', value: 'NaN' }],
    ['depth=none', { reason: 'notAFigure', key: 'depth', value: 'none' }],
    ['basis=best', { reason: 'notAChoice', key: 'basis', value: 'best' }],
    ['typed.colour=red', { reason: 'unknownKey', key: 'typed.colour', value: 'red' }],
  ])('names %s and goes on', (part, problem) => {
    const { problems, values } = readAddress(`v=1&air=9000&${part}`)
    expect(problems).toEqual([problem])
    expect(values.airPressure).toBe(9000)
    expect(values.depth).toBe(0.42)
  })

  it('uses nothing of a version that it does not know', () => {
    const { problems, ...content } = readAddress('v=2&depth=0.5')
    expect(problems).toEqual([{ reason: 'unknownVersion', key: 'v', value: '2' }])
    expect(content).toEqual(START)
  })

  it('reads an address without a version as the first one, and says so', () => {
    const { problems, values } = readAddress('depth=0.5')
    expect(values.depth).toBe(0.5)
    expect(problems.map(({ reason }) => reason)).toEqual(['noVersion'])
  })

  it.each([
    ['concrete', 0.4, 1e-7, 'yes'],
    ['loose-gravel', 0.45, 1e-2, 'no'],
    ['bare-mud', 0.2, 1e-7, 'no'],
  ])('takes what %s brings along where nothing else is said', (surface, friction, k, suitable) => {
    const { values, choices, problems } = readAddress(`v=1&depth=0.3&surface=${surface}`)
    expect(values).toMatchObject({ friction, permeability: k, layerThickness: 2, depth: 0.3 })
    expect(choices).toMatchObject({ surface, suitable })
    expect(problems).toEqual([])
  })

  it('keeps a friction that is said, whatever stands first', () => {
    expect(readAddress('v=1&friction=0.33&surface=concrete').values.friction).toBe(0.33)
    expect(readAddress('v=1&surface=concrete&friction=0.45').values.friction).toBe(0.45)
  })

  it('gives a surface of the user’s own, or one that it does not know, the default figures', () => {
    expect(readAddress('v=1&surface=own').values.friction).toBe(0.45)
    expect(readAddress('v=1&surface=ice')).toMatchObject({
      values: { friction: 0.45 },
      choices: { surface: 'turf' },
      problems: [{ reason: 'notAChoice', key: 'surface', value: 'ice' }],
    })
  })

  it('takes a bare address as the default case', () => {
    expect(readAddress('')).toEqual({ ...START, problems: [] })
  })
})
