import type { CaseInput, FieldValues } from './case-input'
import { CHOICE_IDS, CHOICES, INITIAL_CHOICES, type Choices } from './choices'
import { isInUse } from './field-faults'
import { FIELD_IDS, fieldOf, type FieldId } from './fields'
import { surfaceFigures } from './surface'

/** Version of the address. Its keys and its default case do not change; a new meaning needs a new one. */
const VERSION = '1'
const NONE = 'none'
const TYPED = 'typed.'
const FIGURE = /^-?\d+(\.\d+)?(e[+-]?\d+)?$/i

/** Something in an address that could not be used. */
export interface AddressProblem {
  readonly reason: 'unknownVersion' | 'noVersion' | 'unknownKey' | 'notAFigure' | 'notAChoice'
  readonly key: string
  readonly value: string
}

/** A refused entry: a number out of range in SI, or the text itself. */
export type RefusedEntry = number | string

/** What an address says. */
export interface AddressContent extends CaseInput {
  /** What was typed in fields that are refused; `values` then holds the last one that was not. */
  readonly refused: Readonly<Partial<Record<FieldId, RefusedEntry>>>
}

export interface ReadAddress extends AddressContent {
  readonly problems: readonly AddressProblem[]
}

/** The default case of version 1. */
export const INITIAL_VALUES = Object.fromEntries(
  FIELD_IDS.map((id) => [id, fieldOf(id).initial]),
) as FieldValues

const FIELD_BY_KEY = new Map(FIELD_IDS.map((id) => [fieldOf(id).key, id]))
const CHOICE_BY_KEY = new Map<string, (typeof CHOICE_IDS)[number]>(
  CHOICE_IDS.map((id) => [CHOICES[id].key, id]),
)

/**
 * The inputs as the query of an address: `v=1`, then plain SI figures under readable keys.
 *
 * The figures on which an answer rests most (water, tube, friction, surface, edge, basis) are always
 * there, so that a link can be read without opening it; the rest only where it differs from what its
 * surface brings along, or from the default case of version 1, which never changes. `none` is a field
 * left empty. An entry that the form refuses follows as `typed.<key>`, beside the last value that was
 * accepted.
 */
export function writeAddress({ values, choices, refused }: AddressContent): string {
  const query = new URLSearchParams({ v: VERSION })
  const usual = caseOn(choices.surface)
  for (const id of CHOICE_IDS) {
    const { key, ...choice } = CHOICES[id]
    if ('isAlwaysSent' in choice || choices[id] !== usual.choices[id]) query.set(key, choices[id])
  }
  for (const id of FIELD_IDS) {
    const { key } = fieldOf(id)
    const value = values[id]
    const isTold = isToldAlways(id, choices) || value !== usual.values[id]
    if (isInUse(id, choices) && isTold) query.set(key, value === null ? NONE : String(value))
    const entry = refused[id]
    if (entry !== undefined) query.set(TYPED + key, String(entry))
  }
  return query.toString()
}

/** A level is told with its ground, a gauge reading with its zero: neither means anything alone. */
function isToldAlways(id: FieldId, { waterMode }: Choices): boolean {
  if (id === 'level' || id === 'groundLevel' || id === 'stage' || id === 'gaugeZero')
    return waterMode !== 'depth'
  return fieldOf(id).isAlwaysSent ?? false
}

/** Reads the query of an address. Whatever cannot be used is named in `problems`; nothing is dropped silently. */
export function readAddress(search: string): ReadAddress {
  const query = new URLSearchParams(search)
  const version = query.get('v')
  if (version !== null && version !== VERSION)
    return {
      ...caseOn(CHOICES.surface.initial),
      problems: [{ reason: 'unknownVersion', key: 'v', value: version }],
    }

  const content = caseOn(query.getAll(CHOICES.surface.key).at(-1) ?? CHOICES.surface.initial)
  const problems: AddressProblem[] = []
  for (const [key, value] of query) {
    const reason = key === 'v' ? null : readEntry(content, key, value)
    if (reason) problems.push({ reason, key, value })
  }
  if (version === null && query.size > 0)
    problems.push({ reason: 'noVersion', key: 'v', value: VERSION })
  return { ...content, problems }
}

interface Draft {
  readonly values: Record<FieldId, number | null>
  readonly choices: Record<keyof Choices, string>
  readonly refused: Partial<Record<FieldId, RefusedEntry>>
}

/** The default case on a surface: with its friction, permeability and fitness where nothing else is said. */
function caseOn(surface: string): Draft & AddressContent {
  const figures = surfaceFigures(surface)
  const suitable = figures?.suitable ?? INITIAL_CHOICES.suitable
  return {
    values: { ...INITIAL_VALUES, ...figures?.values },
    choices: { ...INITIAL_CHOICES, suitable },
    refused: {},
  }
}

function readEntry(into: Draft, key: string, value: string): AddressProblem['reason'] | null {
  const choice = CHOICE_BY_KEY.get(key)
  if (choice) return readChoice(into, choice, value)
  const typedField = key.startsWith(TYPED) ? FIELD_BY_KEY.get(key.slice(TYPED.length)) : undefined
  if (typedField) {
    into.refused[typedField] = isFigure(value) ? Number(value) : value
    return null
  }
  const field = FIELD_BY_KEY.get(key)
  return field ? readFigure(into, field, value) : 'unknownKey'
}

function readChoice(
  into: Draft,
  id: keyof Choices,
  value: string,
): AddressProblem['reason'] | null {
  const options: readonly string[] = CHOICES[id].options
  if (!options.includes(value)) return 'notAChoice'
  into.choices[id] = value
  return null
}

function readFigure(into: Draft, id: FieldId, value: string): AddressProblem['reason'] | null {
  if (value === NONE && fieldOf(id).isOptional) into.values[id] = null
  else if (isFigure(value)) into.values[id] = Number(value)
  else return 'notAFigure'
  return null
}

function isFigure(value: string): boolean {
  return FIGURE.test(value) && Number.isFinite(Number(value))
}
