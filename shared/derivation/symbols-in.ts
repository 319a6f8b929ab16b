import type { FunctionNode, MathNode, SymbolNode } from 'mathjs'
import { parseFormula } from './math'

/** Functions whose second argument is a variable of their own. */
const BINDING = new Set(['integral', 'series', 'largest', 'smallest'])
const CONSTANTS = new Set(['pi'])

/** Names of the quantities in an expression, in the order in which they stand. */
export function symbolsIn(expression: string): readonly string[] {
  const found = new Set<string>()
  collect(parseFormula(expression), new Set(CONSTANTS), found)
  return [...found]
}

function collect(node: MathNode, bound: ReadonlySet<string>, found: Set<string>): void {
  if (node.type === 'SymbolNode') {
    const { name } = node as SymbolNode
    if (!bound.has(name)) found.add(name)
    return
  }
  if (node.type !== 'FunctionNode') {
    node.forEach((child) => collect(child, bound, found))
    return
  }
  const { fn, args } = node as FunctionNode
  const name = (fn as unknown as SymbolNode).name
  const variable = name === 'largest' || name === 'smallest' ? args[0] : args[1]
  const inner = BINDING.has(name) && variable ? new Set([...bound, variable.toString()]) : bound
  for (const arg of args) collect(arg, inner, found)
}
