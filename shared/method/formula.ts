import type { CheckTag } from '../verification/check-row'

/** A symbol of a formula. */
export interface FormulaSymbol {
  /** As TeX. */
  readonly tex: string
  readonly meaning: string
  /** SI unit; '–' for a pure number. */
  readonly unit: string
  /** What the program takes for it; left out where it is worked out, not entered. */
  readonly range?: string
}

/** A figure with its symbol. */
export interface Figure {
  readonly tex: string
  readonly value: number
  readonly unit: string
}

/** A worked figure: what is given, and what the engine makes of it when it is asked. */
export interface WorkedFigure {
  readonly given: readonly Figure[]
  readonly compute: () => readonly Figure[]
}

/** One relation of the method, as the engine computes it. */
export interface Formula {
  readonly id: string
  readonly title: string
  /** Lines of TeX. */
  readonly tex: readonly string[]
  readonly symbols: readonly FormulaSymbol[]
  /** Range and assumptions, a sentence each. */
  readonly assumptions: readonly string[]
  readonly source: string
  readonly tag: CheckTag
  readonly worked: WorkedFigure
}

/** A part of the method. */
export interface MethodSection {
  readonly id: string
  readonly title: string
  readonly intro: readonly string[]
  readonly formulas: readonly Formula[]
}

/** A value with its unit, under its symbol. */
export type Given = readonly [tex: string, value: number, unit: string]

/**
 * A worked figure whose given values are those that it is computed from: the page cannot show other
 * ones.
 */
export function worked<Name extends string>(
  given: Readonly<Record<Name, Given>>,
  compute: (values: Readonly<Record<Name, number>>) => readonly Given[],
): WorkedFigure {
  const entries = Object.entries<Given>(given)
  const values = Object.fromEntries(entries.map(([name, [, value]]) => [name, value])) as Record<
    Name,
    number
  >
  return {
    given: entries.map(([, figure]) => figureOf(figure)),
    compute: () => compute(values).map(figureOf),
  }
}

function figureOf([tex, value, unit]: Given): Figure {
  return { tex, value, unit }
}
