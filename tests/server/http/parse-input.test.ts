import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { parseInput } from '../../../server/http/parse-input'
import { InvalidInputError, OutOfRangeError } from '../../../shared/errors'
import { emailSchema, passwordSchema } from '../../../shared/schemas/account'

const schema = z.strictObject({
  name: z.string().trim().min(1).max(5),
  depth: z.number().min(0).max(1).optional(),
  list: z.array(z.strictObject({ at: z.number() })).optional(),
  email: emailSchema.optional(),
  password: passwordSchema.optional(),
  kind: z.enum(['turf', 'asphalt']).optional(),
})

function refusalOf(input: unknown): InvalidInputError | OutOfRangeError {
  try {
    parseInput(schema, input)
  } catch (error) {
    if (error instanceof InvalidInputError || error instanceof OutOfRangeError) return error
  }
  throw new Error('nothing was refused')
}

describe('parsed input', () => {
  it('is what the schema makes of it', () => {
    expect(parseInput(schema, { name: ' Quay ', depth: 1 })).toEqual({ name: 'Quay', depth: 1 })
  })

  it.each([
    [{ name: '' }, 'name', 'name: nothing is not allowed; it must be at least one character'],
    [
      { name: 'Low road' },
      'name',
      'name: "Low road" is not allowed; it must be 5 characters or less',
    ],
    [{}, 'name', 'name: nothing is not allowed; it must be a text'],
    [{ name: 'a', list: [{ at: 1 }, { at: 'x' }] }, 'list[1].at', /^list\[1\]\.at: "x" is not/],
    [{ name: 'a', more: 1 }, 'more', 'more: 1 has no place here; there is no such field'],
    [{ name: 'a', list: [{ at: 1, no: 2 }] }, 'list[0].no', /^list\[0\]\.no: 2 has no place/],
    [
      { name: 'a', kind: 'mud' },
      'kind',
      'kind: "mud" is not allowed; it must be one of turf, asphalt',
    ],
    [
      { name: 'a', email: 'b' },
      'email',
      'email: "b" is not allowed; it must be an address for mail',
    ],
    [[], 'body', 'body: a list is not allowed; it must be an object'],
    [null, 'body', 'body: nothing is not allowed; it must be an object'],
  ])('is refused as %j with a message that names %s', (input, path, message) => {
    const refusal = refusalOf(input)
    expect(refusal).toBeInstanceOf(InvalidInputError)
    expect(refusal.faults[0]!.path).toBe(path)
    expect(refusal.faults[0]!.message).toMatch(message)
  })

  it('is out of range where nothing but numbers are', () => {
    const refusal = refusalOf({ name: 'a', depth: 1.5 })
    expect(refusal).toBeInstanceOf(OutOfRangeError)
    expect(refusal.message).toBe('depth: 1.5 is not allowed; it must be 1 or less')
    expect(refusalOf({ name: '', depth: 1.5 })).toBeInstanceOf(InvalidInputError)
  })

  it('names every fault at once', () => {
    expect(refusalOf({ depth: 2, kind: 'mud' }).faults.map(({ path }) => path)).toEqual([
      'name',
      'depth',
      'kind',
    ])
  })

  it('never sends a password back', () => {
    const { faults } = refusalOf({ name: 'a', password: 'too short' })
    expect(JSON.stringify(faults)).not.toContain('too short')
    expect(faults[0]!.message).toMatch(/^password: what was entered is not allowed/)
  })
})
