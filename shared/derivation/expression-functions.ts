import type { MathNode } from 'mathjs'
import { doubleExponential } from './quadrature'

type Scope = Map<string, unknown>

/** The part of a mathjs unit that an integral needs. */
interface UnitLike {
  toNumber: (unit: string) => number
  toSI: () => UnitLike
  formatUnits: () => string
}

/** What mathjs gives for an expression: a pure number, or a number with its unit. */
export type Evaluated = number | UnitLike

function isUnit(value: unknown): value is UnitLike {
  return typeof value === 'object' && value !== null && 'toSI' in value
}

/** The number of a value in SI base units. */
export function inSi(value: unknown): number {
  if (!isUnit(value)) return Number(value)
  const si = value.toSI()
  return si.toNumber(si.formatUnits())
}

function raw<F extends (args: MathNode[], math: unknown, scope: Scope) => unknown>(f: F): F {
  return Object.assign(f, { rawArgs: true as const })
}

/** Numbers of a scope in SI base units: an integrand is evaluated a hundred times, units once. */
function numericScope(scope: Scope): Map<string, unknown> {
  const numbers = new Map<string, unknown>()
  for (const [name, value] of scope) numbers.set(name, isUnit(value) ? inSi(value) : value)
  return numbers
}

/**
 * `integral(f, y, a, b)`: the integral of f over y from a to b.
 *
 * The dimension comes from one evaluation with units in the middle; the value from SI numbers.
 */
export const integral = raw((args, math, scope) => {
  const [f, variable, from, to] = args as [MathNode, MathNode, MathNode, MathNode]
  const name = variable.toString()
  const low = from.compile().evaluate(scope) as Evaluated
  const high = to.compile().evaluate(scope) as Evaluated
  const { multiply, add, subtract } = math as {
    multiply: (a: unknown, b: unknown) => Evaluated
    add: (a: unknown, b: unknown) => Evaluated
    subtract: (a: unknown, b: unknown) => Evaluated
  }
  const code = f.compile()
  // `0 m` from a formula counts as a bound, too: a bare 0 takes the unit of the other bound.
  const lower = low === 0 ? multiply(0, high) : low
  const span = subtract(high, lower)
  const middle = add(lower, multiply(0.5, span))
  const atMiddle = code.evaluate(new Map([...scope, [name, middle]])) as Evaluated
  const sample = multiply(atMiddle, span)
  const numbers = numericScope(scope)
  const value = doubleExponential(
    (x) => Number(code.evaluate(numbers.set(name, x))),
    inSi(lower),
    inSi(high),
  )
  return isUnit(sample) ? multiply(sample, value / inSi(sample)) : value
})

/** Terms of a series after which e^(−n²π²τ) is below 1e-18 for every τ that uses one. */
const LONGEST = 400

/** `series(f, n, first, step)`: the sum of f over n = first, first + step … to its end; f is a number. */
export const series = raw((args, _math, scope) => {
  const [f, variable, first, step] = args as [MathNode, MathNode, MathNode, MathNode]
  const code = f.compile()
  const name = variable.toString()
  const [from, by] = [Number(first.toString()), Number(step.toString())]
  const numbers = numericScope(scope)
  let sum = 0
  for (let n = from; n < LONGEST; n += by) {
    const term = Number(code.evaluate(numbers.set(name, n)))
    sum += term
    if (Math.abs(term) < 1e-18) break
  }
  return sum
})

/** `agm(a, b)`: arithmetic–geometric mean of two positive numbers. */
export function agm(a: number, b: number): number {
  let [x, y] = [a, b]
  for (let step = 0; step < 60 && Math.abs(x - y) > 1e-15 * x; step += 1) {
    ;[x, y] = [0.5 * (x + y), Math.sqrt(x * y)]
  }
  return x
}
