import { DerivationDisagreementError, type DisagreementReason } from './disagreement'
import { inSi, type Evaluated } from './expression-functions'
import { holdsToFault, isSearch, LARGEST_HOLDING } from './holds-to-proof'
import { proofCounts, type Derivation, type DerivationLine, type ProofCounts } from './line'
import type { SheetFigure } from './line'
import { math, parseFormula } from './math'
import { sheetUnit } from './sheet-units'

/** Relative difference that two routes in double precision may have. */
const BOUND = 1e-9
/** What rounding leaves where large terms cancel: share of the largest figure of the line. */
const CANCELLATION = 4e-15

/**
 * Computes a finished derivation a second time, from its own lines: direct lines by mathjs with
 * units, the rest by substitution into both sides of their governing equation.
 *
 * @returns How many lines were recomputed and how many substituted: all of them.
 * @throws DerivationDisagreementError that names the first line that does not agree.
 */
export function verifyDerivation(derivation: Derivation): ProofCounts {
  const { givens, unknowns, lines } = derivation
  const known = new Map([...givens, ...unknowns].map((figure) => [figure.symbol, figure]))
  for (const line of lines) {
    assertInputs(line, known)
    assertLine(line, derivation)
    const root = unknowns.find(({ symbol }) => symbol === line.symbol)
    if (root && root.value !== line.result.value) fail(line, 'figure', 'not the root used before')
    known.set(line.symbol, line.result)
  }
  return proofCounts(derivation)
}

function fail(line: DerivationLine, reason: DisagreementReason, detail: string): never {
  throw new DerivationDisagreementError(line.number, line.id, reason, detail)
}

/** What a line uses must be what was entered, or what an earlier line gave, to the last bit. */
function assertInputs(line: DerivationLine, known: ReadonlyMap<string, SheetFigure>): void {
  for (const { symbol, value, unit } of line.inputs) {
    const source = known.get(symbol)
    if (!source) fail(line, 'missing', `${symbol} is not known here`)
    if (source.unit !== unit) fail(line, 'unit', `${symbol} is in ${source.unit}, not in ${unit}`)
    if (source.value !== value) fail(line, 'input', `${symbol} is ${source.value}, not ${value}`)
  }
}

function assertLine(line: DerivationLine, { section, system, gripShare }: Derivation): void {
  const { result, symbol } = line
  if (result.symbol !== symbol) fail(line, 'expression', `the result is ${result.symbol}`)
  if (sheetUnit(result.kind, system).unit !== result.unit) {
    fail(line, 'unit', `${result.unit} is not the unit of this figure`)
  }
  if (isSearch(line.formula)) {
    const depth = result.value * sheetUnit(result.kind, system).factor
    const fault = holdsToFault(
      { section, gripShare },
      depth,
      line.formula === LARGEST_HOLDING ? 1 : -1,
    )
    if (fault !== null) fail(line, 'figure', fault)
    return
  }
  const [left, right] = sidesOf(line)
  assertEqual(line, left, right)
}

/** Both sides of a line, evaluated with units. */
export function sidesOf(line: DerivationLine): readonly [Evaluated, Evaluated] {
  const figures = [...line.inputs, line.result]
  const scope = new Map<string, unknown>(figures.map((f) => [f.symbol, withUnit(line, f)]))
  return [evaluate(line, line.left, scope), evaluate(line, line.formula, scope)]
}

function withUnit(line: DerivationLine, { value, unit }: SheetFigure): unknown {
  if (unit === '') return value
  try {
    return math.unit(value, unit)
  } catch {
    return fail(line, 'unit', `${unit} is not a unit`)
  }
}

function evaluate(line: DerivationLine, expression: string, scope: Map<string, unknown>) {
  // A direct line must not find its own result in its formula.
  const inputs = new Map(scope)
  if (line.proof === 'recomputed' && expression === line.formula) inputs.delete(line.symbol)
  try {
    return parseFormula(expression).compile().evaluate(inputs) as Evaluated
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error)
    return fail(line, 'expression', `${expression} cannot be evaluated: ${reason}`)
  }
}

function assertEqual(line: DerivationLine, left: Evaluated, right: Evaluated): void {
  const isPure = typeof left === 'number' && typeof right === 'number'
  if (!isPure && !isSameDimension(left, right)) {
    fail(line, 'unit', 'the two sides do not have the same dimension')
  }
  const [a, b] = [inSi(left), inSi(right)]
  if (!Number.isFinite(a) || !Number.isFinite(b)) fail(line, 'figure', `${a} against ${b} (SI)`)
  const scale = Math.max(Math.abs(a), Math.abs(b))
  if (Math.abs(a - b) <= BOUND * scale + CANCELLATION * largestFigure(line)) return
  fail(line, 'figure', `${a} against ${b} (SI)`)
}

function isSameDimension(left: Evaluated, right: Evaluated): boolean {
  if (typeof left === 'number' || typeof right === 'number') return false
  return (left as unknown as { equalBase: (other: unknown) => boolean }).equalBase(right)
}

function largestFigure(line: DerivationLine): number {
  const sizes = [...line.inputs, line.result].map((figure) =>
    Math.abs(inSi(withUnit(line, figure))),
  )
  return Math.max(...sizes)
}
