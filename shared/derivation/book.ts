import type { CheckId } from '../schemas/check-ids'
import type { SectionCase } from '../schemas/section-case'
import type { UnitSystem } from '../units'
import type { Derivation, DerivationLine, GroupId, SheetFigure } from './line'
import { sheetUnit, type FigureKind } from './sheet-units'
import type { SourceId } from './sources'
import { symbolsIn } from './symbols-in'

/** A line as it is written down; figures in SI. */
export interface LineSpec {
  readonly id: string
  readonly symbol: string
  readonly formula: string
  /** Left side of a governing equation; left out: the symbol, and the line is recomputed. */
  readonly left?: string
  /** The figure of the engine [SI]. */
  readonly value: number
  readonly kind: FigureKind
  readonly source: SourceId
  /** The figure is a root, an integral or a series on the right. */
  readonly isSubstituted?: boolean
  readonly hasNote?: boolean
  readonly check?: CheckId
  readonly rounding?: 'down'
}

/** Collects the lines of a derivation and what they use. */
export interface Book {
  /** Makes an input known under its symbol [SI]. */
  readonly given: (symbol: string, value: number, kind: FigureKind) => void
  /** Makes a root known before its line: several unknowns may stand in each other's equations. */
  readonly unknown: (symbol: string, value: number, kind: FigureKind) => void
  /** What is known under a symbol [SI]. */
  readonly valueOf: (symbol: string) => number
  readonly line: (group: GroupId, spec: LineSpec) => void
  readonly finish: () => Derivation
}

function figuresIn(system: UnitSystem) {
  return (symbol: string, value: number, kind: FigureKind, isGiven: boolean): SheetFigure => {
    const { unit, factor } = sheetUnit(kind, system)
    return { symbol, value: value / factor, unit, kind, isGiven, rounding: 'nearest' }
  }
}

function lineOf(
  spec: LineSpec,
  group: GroupId,
  inputs: readonly SheetFigure[],
  result: SheetFigure,
): DerivationLine {
  return {
    id: spec.id,
    number: '',
    group,
    name: { key: `derivation.line.${spec.id}` },
    symbol: spec.symbol,
    proof: spec.left !== undefined || spec.isSubstituted ? 'substituted' : 'recomputed',
    left: spec.left ?? spec.symbol,
    formula: spec.formula,
    inputs,
    result,
    source: spec.source,
    note: spec.hasNote ? { key: `derivation.note.${spec.id}` } : null,
    check: spec.check ?? null,
  }
}

/** An empty book for one case. */
export function openBook(section: SectionCase, system: UnitSystem, gripShare = 1): Book {
  const known = new Map<string, SheetFigure>()
  const used = new Set<SheetFigure>()
  const unknowns: SheetFigure[] = []
  const lines: DerivationLine[] = []

  const figure = figuresIn(system)

  function inputsOf(spec: LineSpec): readonly SheetFigure[] {
    const names = [...new Set([...symbolsIn(spec.left ?? spec.symbol), ...symbolsIn(spec.formula)])]
    return names
      .filter((name) => name !== spec.symbol)
      .map((name) => {
        const input = known.get(name)
        if (!input) throw new Error(`line ${spec.id} uses ${name} before it is known`)
        if (input.isGiven) used.add(input)
        return input
      })
  }

  function write(group: GroupId, spec: LineSpec): void {
    const inputs = inputsOf(spec)
    const rounding = spec.rounding ?? ('nearest' as const)
    const result = { ...figure(spec.symbol, spec.value, spec.kind, false), rounding }
    known.set(spec.symbol, result)
    lines.push(lineOf(spec, group, inputs, result))
  }

  return {
    given: (symbol, value, kind) => {
      if (!known.has(symbol)) known.set(symbol, figure(symbol, value, kind, true))
    },
    unknown: (symbol, value, kind) => {
      const root = figure(symbol, value, kind, false)
      unknowns.push(root)
      known.set(symbol, root)
    },
    valueOf: (symbol) => {
      const figure = known.get(symbol)
      if (!figure) throw new Error(`${symbol} is not known`)
      return figure.value * sheetUnit(figure.kind, system).factor
    },
    line: write,
    finish: () => ({
      section,
      system,
      gripShare,
      givens: [...used],
      unknowns,
      lines: numbered(lines),
    }),
  }
}

/** Groups are numbered in the order in which they were begun. */
function numbered(lines: readonly DerivationLine[]): readonly DerivationLine[] {
  const present = [...new Set(lines.map(({ group }) => group))]
  const counts = new Map<GroupId, number>()
  return [...lines]
    .sort((a, b) => present.indexOf(a.group) - present.indexOf(b.group))
    .map((line) => {
      const place = (counts.get(line.group) ?? 0) + 1
      counts.set(line.group, place)
      return { ...line, number: `${present.indexOf(line.group) + 1}.${place}` }
    })
}
