import { describe, expect, it } from 'vitest'
import { InvalidInputError, OutOfRangeError, type Fault } from '../../../shared/errors'
import { parseSectionCase } from '../../../shared/schemas/parse-section-case'
import { NUMERIC_PATHS, SECTION_RANGES } from '../../../shared/schemas/section-ranges'

const least = {
  barrier: { diameter: 0.7, skirtLength: 2.2, mass: 4.8, airPressure: 15_000 },
  ground: { friction: 0.45 },
  water: { depth: 0.42 },
}

function faultsOf(input: unknown): { kind: string; faults: readonly Fault[] } {
  try {
    parseSectionCase(input)
  } catch (error) {
    if (error instanceof InvalidInputError) return { kind: 'shape', faults: error.faults }
    if (error instanceof OutOfRangeError) return { kind: 'range', faults: error.faults }
    throw error
  }
  throw new Error('accepted')
}

const water = (change: object) => ({ ...least, water: { ...least.water, ...change } })
const barrier = (change: object) => ({ ...least, barrier: { ...least.barrier, ...change } })

describe('a case from outside', () => {
  it('gets every default of the contract', () => {
    expect(parseSectionCase(least)).toEqual({
      barrier: { ...least.barrier, contactWidth: 0, sectionLength: 10, fabricStrength: null },
      ground: { friction: 0.45, fall: 0, suitable: true, permeability: null, layerThickness: null },
      uplift: { model: 'linear', edgeFactor: 1, diffusivity: null, time: null },
      water: {
        depth: 0.42,
        dryDepth: 0,
        density: 1000,
        currentSpeed: 0,
        dragCoefficient: 2,
        waveHeight: 0,
        wavePeriod: null,
      },
      debris: { force: 0, draught: 0.25 },
      gravity: 9.81,
      requiredFreeboard: 0.1,
      basis: 'global-1.5',
    })
  })

  it.each([
    ['a depth above 1.5 D', water({ depth: 1.06 }), 'water.depth', 1.06, '0 to 1.05 m'],
    ['a negative length', barrier({ skirtLength: -1 }), 'barrier.skirtLength', -1, '0 to 15 m'],
    ['friction 5', { ...least, ground: { friction: 5 } }, 'ground.friction', 5, 'above 0 to 1.5'],
    ['millimetres', barrier({ diameter: 700 }), 'barrier.diameter', 700, '0.2 to 3 m'],
    ['a missing period', water({ waveHeight: 0.1 }), 'water.wavePeriod', null, '0.5 to 20 s'],
    [
      'a weighed edge of more than the whole head',
      { ...least, uplift: { weighedEdgeFactor: 1.2 } },
      'uplift.weighedEdgeFactor',
      1.2,
      '0 to 1',
    ],
    ['a wide strip', barrier({ contactWidth: 0.36 }), 'barrier.contactWidth', 0.36, '0 to 0.35 m'],
  ])('is refused for %s, naming field, value and range', (_what, input, path, value, allowed) => {
    const { kind, faults } = faultsOf(input)
    expect(kind).toBe('range')
    expect(faults.map((fault) => fault.path)).toContain(path)
    const fault = faults.find((candidate) => candidate.path === path)!
    expect(fault).toMatchObject({ value, allowed })
    expect(fault.message).toContain(path)
    expect(fault.message).toContain(allowed)
  })

  it.each([
    ['text in a number', water({ depth: '0,42' }), 'water.depth', '"0,42"'],
    ['NaN', water({ depth: Number.NaN }), 'water.depth', 'NaN'],
    ['1e309', water({ depth: Number('1e309') }), 'water.depth', 'Infinity'],
    ['an empty field', water({ depth: '' }), 'water.depth', 'nothing'],
    ['a missing field', { ...least, water: {} }, 'water.depth', 'nothing'],
    ['a missing part', { ...least, water: undefined }, 'water', 'nothing'],
    ['an unknown key', barrier({ colour: 'red' }), 'barrier.colour', '"red" has no place here'],
    ['an unknown part', { ...least, wind: 3 }, 'wind', 'one of command, barrier, ground'],
    [
      'an unknown ground',
      { ...least, uplift: { eta: 1 } },
      'uplift.eta',
      'one of model, edgeFactor',
    ],
    ['an unknown model', { ...least, uplift: { model: 'guess' } }, 'uplift.model', '"guess"'],
    ['another command', { ...least, command: 'duty' }, 'command', '"duty"'],
    ['a list of nothing', [], 'case', 'a list'],
    ['nothing', null, 'case', 'nothing'],
  ])('is refused for %s as a wrong shape', (_what, input, path, shown) => {
    const { kind, faults } = faultsOf(input)
    expect(kind).toBe('shape')
    expect(faults[0]!.path).toBe(path)
    expect(faults[0]!.message).toContain(shown)
  })

  it('is taken at 1.5 diameters exactly, whatever binary makes of it', () => {
    expect(parseSectionCase(water({ depth: 1.05 })).water.depth).toBe(1.05)
    expect(parseSectionCase(barrier({ contactWidth: 0.35 })).barrier.contactWidth).toBe(0.35)
  })

  it('is told of wrong shapes and wrong ranges together', () => {
    const { kind, faults } = faultsOf({ ...barrier({ mass: '4.8' }), ground: { friction: 5 } })
    expect(kind).toBe('shape')
    expect(faults.map(({ path }) => path)).toEqual(['barrier.mass', 'ground.friction'])
  })

  it('is told of every fault at once', () => {
    const { faults } = faultsOf({
      ...least,
      barrier: { ...least.barrier, diameter: 9, mass: -1 },
      ground: { friction: 5 },
    })
    expect(faults.map(({ path }) => path)).toEqual([
      'barrier.diameter',
      'barrier.mass',
      'ground.friction',
    ])
  })
})

describe('the table of ranges', () => {
  it('refuses just outside each end and takes each end', () => {
    for (const path of NUMERIC_PATHS) {
      const { min, max } = SECTION_RANGES[path]
      const set = (value: number): unknown => withValue(path, value)
      expect(
        faultsOf(set(min - 1e-6)).faults.some((fault) => fault.path === path),
        path,
      ).toBe(true)
      if (typeof max === 'number' && Number.isFinite(max)) {
        const { faults } = faultsOf(set(max + 1e-6))
        expect(
          faults.some((fault) => fault.path === path),
          path,
        ).toBe(true)
      }
    }
  })

  function withValue(path: string, value: number): unknown {
    const [part, key] = path.split('.') as [string, string | undefined]
    if (key === undefined) return { ...least, [part]: value }
    const old = (least as Record<string, object>)[part] ?? {}
    return { ...least, [part]: { ...old, [key]: value } }
  }
})
