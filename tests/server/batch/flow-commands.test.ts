import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { runBatch } from '../../../server/batch/batch-command'
import { COMMANDS } from '../../../server/batch/commands'
import { InvalidInputError, OutOfRangeError } from '../../../shared/errors'
import type { EventResult } from '../../../shared/schemas/event-case'
import { exampleSection } from '../../../shared/verification/example-section'
import extra from '../../golden/extra.json'
import flows from '../../golden/flow.json'
import { expectClose, expectPrinted } from '../../support/close-to'

const command = (name: string) => COMMANDS.find((candidate) => candidate.name === name)!
const calc = (name: string, input: unknown): unknown => runBatch(command(name), input)

function faultsOf(name: string, input: unknown): readonly string[] {
  try {
    calc(name, input)
  } catch (error) {
    if (error instanceof OutOfRangeError || error instanceof InvalidInputError) {
      return error.faults.map(({ message }) => message)
    }
    throw error
  }
  return []
}

const SEEPAGE = flows[0]!.case
const DUTY = flows[2]!.case

describe('calc seepage', () => {
  it('answers the worked cases', () => {
    const worked = flows.filter(({ case: { command: name } }) => name === 'seepage')
    const answers = calc(
      'seepage',
      worked.map((flow) => flow.case),
    ) as { perMetre: number }[]
    for (const [i, { expected }] of worked.entries()) {
      expectClose(answers[i]!.perMetre, expected.perMetre!, 1e-9)
    }
  })

  it('lets nothing through ground of no permeability, and takes a base of 1000 layers', () => {
    expect(calc('seepage', { ...SEEPAGE, permeability: 0 })).toEqual({ perMetre: 0 })
    const wide = { ...SEEPAGE, baseWidth: 1000, layerThickness: 1 }
    // Asymptote 1/(B/T + 4 ln 2/π), derived: 0.88254.
    const { perMetre } = calc('seepage', wide) as { perMetre: number }
    expectClose(perMetre, 1e-4 / (1000 + (4 * Math.LN2) / Math.PI), 1e-12)
  })

  it.each([
    ['a head below nothing', { head: -1 }, 'head: -1 is not allowed; it must be 0 to 100 m'],
    ['no base', { baseWidth: 0 }, 'baseWidth: 0 is not allowed; it must be 0.001 to 10000 m'],
    [
      'no layer',
      { layerThickness: 0 },
      'layerThickness: 0 is not allowed; it must be 0.001 to 100000 m',
    ],
    [
      'no number',
      { permeability: null },
      'permeability: nothing is not allowed; it must be a number',
    ],
    [
      'another command',
      { command: 'duty' },
      'command: "duty" is not allowed; it must be one of seepage',
    ],
    ['a field of its own', { colour: 1 }, 'colour: 1 has no place here; there is no such field'],
  ])('refuses %s', (_what, change, message) => {
    expect(faultsOf('seepage', { ...SEEPAGE, ...change })).toEqual([message])
  })
})

describe('calc duty', () => {
  it('has three states, and tells what is left only where the pump runs out', () => {
    const answers = flows.slice(2).map((flow) => calc('duty', flow.case))
    expect(answers).toMatchObject([
      { state: 'duty' },
      { state: 'runs-out' },
      { state: 'does-not-pump', flow: 0, head: 12 },
    ])
    expect(answers.map((answer) => 'headLeft' in (answer as object))).toEqual([false, true, false])
    // Pump head less system head at the last point: 5.0 − 1.1276816404792926.
    expectClose((answers[1] as { headLeft: number }).headLeft, 5 - 1.1276816404792926, 1e-9)
  })

  it('stays at the first crossing where a hollow curve rises again', () => {
    const pumpCurve = [
      [0, 20],
      [0.01, 2],
      [0.02, 20],
    ]
    const { state, flow } = calc('duty', { ...DUTY, pumpCurve }) as { state: string; flow: number }
    expect(state).toBe('duty')
    expect(flow).toBeLessThan(0.01)
  })

  it('does not pump against a static head above the shut-off head', () => {
    expect(calc('duty', { ...DUTY, staticHead: 16.001 })).toMatchObject({ state: 'does-not-pump' })
    expect(calc('duty', { ...DUTY, staticHead: 15.99 })).toMatchObject({ state: 'duty' })
  })

  it.each([
    [
      'one point',
      { pumpCurve: [[0, 10]] },
      /^pumpCurve\.length: 1 is not allowed; it must be 2 to 200 points$/,
    ],
    [
      'a curve that starts above zero flow',
      {
        pumpCurve: [
          [0.001, 9],
          [0.01, 4],
        ],
      },
      /^pumpCurve\[0\]\[0\]: 0\.001/,
    ],
    [
      'flows that fall',
      {
        pumpCurve: [
          [0, 9],
          [0.01, 5],
          [0.005, 7],
        ],
      },
      /^pumpCurve\[2\]\[0\]: 0\.005/,
    ],
    [
      'a flow twice',
      {
        pumpCurve: [
          [0, 9],
          [0.01, 5],
          [0.01, 4],
        ],
      },
      /above 0\.01/,
    ],
    ['a hose of no width', { hose: { ...DUTY.hose!, diameter: 0 } }, /^hose\.diameter: 0/],
    [
      'a hose rougher than wide',
      { hose: { ...DUTY.hose!, roughness: 0.02 } },
      /^hose\.roughness: 0\.02 .* 0 to 0\.005 m$/,
    ],
    ['half a pump', { pumps: 1.5 }, /^pumps: 1\.5 is not allowed/],
    ['oil of another world', { viscosity: 1 }, /^viscosity: 1 is not allowed/],
  ])('refuses %s', (_what, change, message) => {
    const faults = faultsOf('duty', { ...DUTY, ...change })
    expect(faults).toHaveLength(1)
    expect(faults[0]).toMatch(message)
  })
})

describe('calc ponding', () => {
  const block = (id: string) =>
    extra.find((entry) => entry.id === id) as unknown as {
      input: Record<string, unknown>
      expected: Record<string, number>
    }

  it('answers the worked cases', () => {
    const { input, expected } = block('ponding')
    const answer = calc('ponding', input) as Record<string, number>
    for (const [name, printed] of Object.entries(expected))
      expectPrinted(answer[name]!, printed, name)
    const growing = block('ponding-stage')
    const { duration, inflow } = growing.input
    const areaTable = [
      [0, 200],
      [0.5, 2200],
    ]
    const stage = calc('ponding', { duration, inflow, areaTable }) as Record<string, number>
    expectPrinted(stage.stored!, growing.expected.volume!)
    expectPrinted(stage.levelAtEnd!, growing.expected.level!)
  })

  it('takes pumps with their curves, a series of inflow, and names when a threshold is reached', () => {
    const { staticHead: _s, command: _c, ...system } = DUTY as Record<string, unknown>
    const answer = calc('ponding', {
      area: 100,
      inflow: [
        [0, 0],
        [3600, 0.02],
      ],
      pumps: [{ name: 'A', startLevel: 0.3, stopLevel: 0.1, outletLevel: 3.2, system }],
      duration: 7200,
      thresholds: [0.2, 9],
    }) as { reaches: unknown; events: { what: string }[] }
    // ½ · 0.02/3600 · t² = 0.2 · 100 m³.
    expect(answer.reaches).toEqual([
      { level: 0.2, time: expect.closeTo(Math.sqrt((20 * 2 * 3600) / 0.02), 6) as number },
      { level: 9, time: null },
    ])
    expect(answer.events[0]).toMatchObject({ what: 'starts' })
  })

  it.each([
    ['no surface', { area: 0 }, /^area: 0 is not allowed; it must be above 0/],
    ['neither area nor table', { area: undefined }, /^area: nothing is not allowed/],
    ['both', { areaTable: [[0, 1]] }, /^area: 800 .* left out where areaTable is given$/],
    ['a stop above the start', { stopLevel: 0.2 }, /^stopLevel: 0\.2 is not allowed/],
    ['a pump without start', { startLevel: undefined }, /^startLevel: nothing is not allowed/],
    ['steps of nothing', { step: 0 }, /^step: 0 is not allowed; it must be 1 to/],
    [
      'time that falls',
      {
        inflow: [
          [10, 1],
          [5, 1],
        ],
      },
      /^inflow\[1\]\[0\]: 5/,
    ],
    ['inflow out of the pond', { inflow: -1 }, /^inflow: -1 is not allowed/],
    ['no time', { duration: 0 }, /^duration: 0 is not allowed/],
  ])('refuses %s', (_what, change, message) => {
    const faults = faultsOf('ponding', { ...block('ponding').input, ...change })
    expect(faults[0]).toMatch(message)
  })
})

const {
  water: { depth: _d, dryDepth: _e, ...water },
  uplift: { time: _t, ...uplift },
  ...rest
} = exampleSection()
const EVENT = {
  section: { ...rest, water, uplift },
  groundLevel: 2.87,
  water: {
    datum: 'QD',
    issued: '2031-03-03T21:45:00Z',
    readings: [
      { time: '2031-03-04T02:00:00+01:00', level: 2.84 as number | null },
      { time: '2031-03-04T03:00:00+01:00', level: 3.16 },
      { time: '2031-03-04T04:00:00+01:00', level: 3.42 },
      { time: '2031-03-04T05:00:00+01:00', level: 3.3 },
    ],
  },
}
const withReadings = (change: (readings: typeof EVENT.water.readings) => unknown) => ({
  ...EVENT,
  water: { ...EVENT.water, readings: change(EVENT.water.readings) },
})

describe('calc event', () => {
  it('says when it fails and when everybody leaves, in UTC', () => {
    const answer = calc('event', EVENT) as EventResult
    expect(answer.verdict).toBe('fails')
    expect(answer.firstFailure).toMatchObject({ check: 'sliding' })
    // 3.3596 m between 3.16 at 03:00 and 3.42 at 04:00, an hour ahead of UTC.
    expect(answer.firstFailure!.from).toMatch(/^2031-03-04T02:46:0\dZ$/)
    expect(Date.parse(answer.leave.time!)).toBeLessThan(Date.parse(answer.firstFailure!.from))
    expect(answer.moments[0]!.time).toBe('2031-03-04T01:00:00Z')
  })

  it('reads feet as feet', () => {
    const inFeet = {
      ...EVENT,
      water: {
        ...EVENT.water,
        unit: 'ft',
        readings: EVENT.water.readings.map(({ time, level }) => ({ time, level: level! / 0.3048 })),
      },
    }
    const [metres, feet] = [calc('event', EVENT), calc('event', inFeet)] as EventResult[]
    expect(feet!.firstFailure!.from).toBe(metres!.firstFailure!.from)
    expect(feet!.verdict).toBe('fails')
  })

  it.each<[string, unknown, RegExp]>([
    [
      'feet that are called metres',
      {
        ...EVENT,
        water: {
          readings: EVENT.water.readings.map(({ time, level }) => ({
            time,
            level: level! / 0.3048,
          })),
        },
      },
      /^water\.readings: 9\.318 m at the least \(unit m\) is not allowed; it must be below 3\.920 m .*check unit and datum$/,
    ],
    [
      'a time without offset',
      withReadings((all) => [{ ...all[0], time: '2031-03-04T02:00:00' }, ...all.slice(1)]),
      /^water\.readings\[0\]\.time: "2031-03-04T02:00:00" is not allowed; it must be a moment with its offset/,
    ],
    [
      'a day that is not there',
      withReadings((all) => [{ ...all[0], time: '2031-02-30T02:00:00Z' }, ...all.slice(1)]),
      /^water\.readings\[0\]\.time: "2031-02-30/,
    ],
    [
      'a time twice',
      withReadings((all) => [all[0], all[0], all[2]]),
      /^water\.readings\[1\]\.time: the same moment twice/,
    ],
    [
      'times that fall',
      withReadings((all) => [...all].reverse()),
      /^water\.readings\[1\]\.time: "[-+:T\d]+" is not allowed; it must be after the reading before it, "/,
    ],
    ['one reading', withReadings((all) => [all[0]]), /^water\.readings\.length: 1 is not allowed/],
    [
      'nothing but gaps',
      withReadings((all) => all.map(({ time }) => ({ time, level: null }))),
      /nothing but empty readings/,
    ],
    [
      'a section that cannot be',
      { ...EVENT, section: { ...EVENT.section, barrier: { ...rest.barrier, diameter: 30 } } },
      /^section\.barrier\.diameter: 30 is not allowed; it must be 0\.2 to 3 m$/,
    ],
    [
      'a text for a level',
      withReadings((all) => [{ ...all[0], level: '3,42' }]),
      /^water\.readings\[0\]\.level: "3,42" is not allowed; it must be a number$/,
    ],
    [
      'a forecast issued never',
      { ...EVENT, water: { ...EVENT.water, issued: 'tonight' } },
      /^water\.issued: "tonight" is not allowed/,
    ],
  ])('refuses %s', (_what, input, message) => {
    expect(faultsOf('event', input)[0]).toMatch(message)
  })

  it('answers 100 000 readings', () => {
    const start = Date.parse('2031-01-01T00:00:00Z')
    const readings = Array.from({ length: 100_000 }, (_, i) => ({
      time: new Date(start + i * 10_000).toISOString(),
      level: i % 50_000 < 49_990 ? 2.5 : 3,
    }))
    const input = { ...EVENT, water: { readings }, step: 3600 }
    expect((calc('event', input) as EventResult).moments.length).toBeGreaterThanOrEqual(100_000)
  }, 20_000)
})

describe.each(COMMANDS.map((each) => [each.name, each] as const))(
  'calc %s --schema',
  (name, each) => {
    it('describes what goes in and what comes out', () => {
      const input = z.fromJSONSchema(z.toJSONSchema(each.inputSchema, { io: 'input' }) as never)
      const output = z.fromJSONSchema(z.toJSONSchema(each.outputSchema, { io: 'output' }) as never)
      const cases: Record<string, unknown> = {
        seepage: SEEPAGE,
        duty: DUTY,
        ponding: extra.find(({ id }) => id === 'ponding')!.input,
        event: EVENT,
      }
      if (name === 'section') return
      input.parse(cases[name])
      output.parse(JSON.parse(JSON.stringify(calc(name, cases[name]))))
      expect(input.safeParse({ ...(cases[name] as object), colour: 'red' }).success).toBe(false)
      expect(output.safeParse({}).success).toBe(false)
    })

    it('refuses anything with its reasons, and never breaks', () => {
      fc.assert(
        fc.property(fc.jsonValue(), (input) => {
          const faults =
            Array.isArray(input) && input.length === 0 ? ['none'] : faultsOf(name, input)
          expect(faults.length).toBeGreaterThan(0)
        }),
        { numRuns: 60 },
      )
    })
  },
)
