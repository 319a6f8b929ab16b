import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { type BatchCommand, runBatch } from '../../../server/batch/batch-command'
import { assertInRange, InvalidInputError, OutOfRangeError } from '../../../shared/errors'

/** Doubles `size`, which may be 0 to 10 m. */
const double: BatchCommand = {
  name: 'double',
  summary: '',
  inputSchema: z.unknown(),
  outputSchema: z.number(),
  answer: (input) => {
    const { size } = input as { size: unknown }
    if (typeof size !== 'number') {
      const message = 'size: it must be a number'
      throw new InvalidInputError([
        { path: 'size', value: size, allowed: 'a number', unit: 'm', message },
      ])
    }
    assertInRange('size', size, { min: 0, max: 10, unit: 'm' })
    return 2 * size
  },
}

function refusalOf(input: unknown): unknown {
  try {
    return runBatch(double, input)
  } catch (error) {
    return error
  }
}

describe('runBatch', () => {
  it('answers one case with one answer and a list with a list', () => {
    expect(runBatch(double, { size: 2 })).toBe(4)
    expect(runBatch(double, [{ size: 2 }, { size: 3 }])).toEqual([4, 6])
    expect(runBatch(double, [])).toEqual([])
  })

  it('reports every fault of every case, led by its place in the list', () => {
    const refusal = refusalOf([{ size: 11 }, { size: 1 }, { size: -1 }])
    expect(refusal).toBeInstanceOf(OutOfRangeError)
    expect((refusal as OutOfRangeError).faults).toMatchObject([
      { path: '[0].size', message: '[0].size: 11 is not allowed; it must be 0 to 10 m' },
      { path: '[2].size', message: '[2].size: -1 is not allowed; it must be 0 to 10 m' },
    ])
  })

  it('takes a list with a wrong shape in it for a wrong shape', () => {
    const refusal = refusalOf([{ size: 11 }, { size: 'two' }])
    expect(refusal).toBeInstanceOf(InvalidInputError)
    expect((refusal as InvalidInputError).faults.map(({ path }) => path)).toEqual([
      '[0].size',
      '[1].size',
    ])
  })

  it.each([
    [null, 'nothing'],
    [5, '5'],
    ['x', '"x"'],
    [[], 'a list'],
  ])('names the place of something that is no case: %j', (item, shown) => {
    const refusal = refusalOf([{ size: 1 }, item])
    expect(refusal).toBeInstanceOf(InvalidInputError)
    expect((refusal as InvalidInputError).message).toBe(
      `[1]: ${shown} is not allowed; it must be an object`,
    )
  })

  it('lets a fault of our own through as it is', () => {
    const own = new Error('not the fault of the case')
    const broken: BatchCommand = {
      ...double,
      answer: () => {
        throw own
      },
    }
    expect(() => runBatch(broken, [{ size: 1 }])).toThrow(own)
  })
})
