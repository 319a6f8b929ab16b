import type { UnitSystem } from '../units'
import { figureUnit, printedNumber } from './figures'
import { inSi } from './expression-functions'
import { layOut, type Box, type ShowSymbol } from './layout'
import type { DerivationLine, SheetFigure } from './line'
import { writeBox, type Written } from './notation'
import { isSearch } from './holds-to-proof'
import { sidesOf } from './verify-derivation'

/** A line in words of mathematics: symbolic, with its numbers, and its result. */
export interface WrittenLine {
  readonly symbol: Written
  /** "F = ½ γ h²", or the governing equation. */
  readonly symbolic: Written
  /** "½ · 9.81 kN/m³ · (0.420 m)²"; null where the numbers would say nothing more. */
  readonly numeric: Written | null
  readonly result: Written
  /** Relative difference of the two sides of a substituted line; null for a direct one, or a search. */
  readonly residual: number | null
}

/** Writes a line down in all notations. */
export function writeLine(line: DerivationLine, system: UnitSystem): WrittenLine {
  const symbol: ShowSymbol = (id) => ({ kind: 'symbol', id })
  const left = layOut(line.left, symbol)
  const right = layOut(line.formula, symbol)
  return {
    symbol: writeBox(layOut(line.symbol, symbol)),
    symbolic: writeBox(equation(left, right)),
    numeric: line.proof === 'recomputed' ? numericOf(line, system) : null,
    result: writeBox(figureBox(line.result, system)),
    residual: residualOf(line),
  }
}

/** One figure with its unit, in all notations. */
export function writeFigure(figure: SheetFigure, system: UnitSystem): Written {
  return writeBox(figureBox(figure, system))
}

function equation(left: Box, right: Box): Box {
  return { kind: 'row', items: [left, '=', right] }
}

function figureBox(figure: SheetFigure, system: UnitSystem): Box {
  const unit = figureUnit(figure.kind, system)
  return { kind: 'figure', ...printedNumber(figure, system), unit }
}

function numericOf(line: DerivationLine, system: UnitSystem): Written {
  const known = new Map(line.inputs.map((input) => [input.symbol, input]))
  const show: ShowSymbol = (id) => {
    const figure = known.get(id)
    return figure ? figureBox(figure, system) : { kind: 'symbol', id }
  }
  return writeBox(layOut(line.formula, show, '*'))
}

function residualOf(line: DerivationLine): number | null {
  if (line.proof === 'recomputed' || isSearch(line.formula)) return null
  const [left, right] = sidesOf(line).map(inSi) as [number, number]
  const scale = Math.max(Math.abs(left), Math.abs(right))
  return scale === 0 ? 0 : Math.abs(left - right) / scale
}
