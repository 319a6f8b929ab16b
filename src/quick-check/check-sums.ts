import {
  checkTerms,
  sumOfTerms,
  type CheckTerm,
  type CheckTerms,
  type SummedCheck,
} from '@shared/checks/check-terms'
import type { SectionCase } from '@shared/schemas/section-case'
import type { Message } from '@shared/texts/format-text'
import type { Quantity, QuantityKind } from '@shared/units'

/** One line of a sum: what it is, what it is multiplied with, what it adds. */
export interface SumRow {
  readonly id: string
  readonly name: Message
  /** Factors of the product; empty where the figure enters as it is. */
  readonly how: readonly Message[]
  readonly adds: Message
}

export interface SumSide {
  readonly id: 'demand' | 'resistance'
  readonly rows: readonly SumRow[]
  readonly totals: readonly SumRow[]
}

export interface CheckSums {
  readonly sides: readonly SumSide[]
  readonly notes: readonly Message[]
}

/** Shows a figure as it was given. */
type Given = (value: number, kind: QuantityKind) => string

/** A check as two sums with their words. */
export function checkSums(section: SectionCase, check: SummedCheck, given: Given): CheckSums {
  const terms = checkTerms(section, check)
  const kind: QuantityKind = check === 'overturning' ? 'momentTerm' : 'forceTerm'
  return {
    sides: [
      side('demand', terms.demand, kind, []),
      side('resistance', terms.resistance, kind, multiplied(terms, kind)),
    ],
    notes: notesOf(section, terms, given),
  }
}

function side(
  id: SumSide['id'],
  terms: readonly CheckTerm[],
  kind: QuantityKind,
  after: readonly SumRow[],
): SumSide {
  const sum = row('sum', { key: 'sectionDetails.sums.sum' }, sumOfTerms(terms), kind)
  return { id, rows: terms.map((term) => termRow(term, kind)), totals: [sum, ...after] }
}

function row(id: string, name: Message, value: number, kind: QuantityKind): SumRow {
  return { id, name, how: [], adds: figure({ value, kind }) }
}

function figure(value: Quantity): Message {
  return { key: 'sectionDetails.sums.figure', values: { value } }
}

function termRow({ id, value, factor, slope, adds }: CheckTerm, kind: QuantityKind): SumRow {
  const isPlain = Math.abs(factor) === 1 && slope === null
  const factors = [
    ...(Math.abs(factor) === 1 ? [] : [ratio(Math.abs(factor))]),
    figure({ value, kind }),
    ...(slope === null ? [] : [{ key: `sectionDetails.sums.${slope}` }]),
  ]
  return {
    id,
    name: { key: `sectionDetails.sums.term.${id}` },
    how: isPlain ? [] : factors,
    adds: figure({ value: adds, kind }),
  }
}

function ratio(value: number): Message {
  return figure({ value, kind: 'ratio' })
}

/** What is done with the sum of the resistance: times friction, over its partial factor. */
function multiplied(terms: CheckTerms, kind: QuantityKind): readonly SumRow[] {
  const { resistance, friction, frictionFactor } = terms
  const total = (sumOfTerms(resistance) * friction) / frictionFactor
  const values = {
    friction: { value: friction, kind: 'ratio' },
    factor: { value: frictionFactor, kind: 'ratio' },
  } as const
  const soft =
    terms.softGround === null
      ? []
      : [row('soft', { key: 'sectionDetails.sums.softGround' }, terms.softGround, kind)]
  if (friction === 1 && frictionFactor === 1) return soft
  const name = friction === 1 ? 'over' : frictionFactor === 1 ? 'friction' : 'frictionPartial'
  const times = row('times', { key: `sectionDetails.sums.${name}`, values }, total, kind)
  return [times, ...soft]
}

function notesOf(section: SectionCase, { combination }: CheckTerms, given: Given): Message[] {
  const { fall } = section.ground
  const cos = 1 / Math.hypot(1, fall)
  const digits = (value: number) => value.toFixed(4).replace('-', '−')
  return [
    ...(combination === null
      ? []
      : [{ key: 'sectionDetails.sums.combination', values: { which: combination } }]),
    ...(fall === 0
      ? []
      : [
          {
            key: 'sectionDetails.sums.slope',
            values: { fall: given(fall, 'percent'), cos: digits(cos), sin: digits(fall * cos) },
          },
        ]),
  ]
}
