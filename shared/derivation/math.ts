import {
  absDependencies,
  acosDependencies,
  addDependencies,
  asinDependencies,
  atanDependencies,
  cosDependencies,
  coshDependencies,
  create,
  type FactoryFunctionMap,
  type MathNode,
  divideDependencies,
  expDependencies,
  maxDependencies,
  minDependencies,
  multiplyDependencies,
  parseDependencies,
  piDependencies,
  powDependencies,
  sinDependencies,
  sinhDependencies,
  sqrtDependencies,
  subtractDependencies,
  tanDependencies,
  tanhDependencies,
  unaryMinusDependencies,
  unitDependencies,
} from 'mathjs'
import { agm, integral, series } from './expression-functions'

/** Operators, functions and units that formulas of a sheet use. */
const PARTS = {
  absDependencies,
  acosDependencies,
  addDependencies,
  asinDependencies,
  atanDependencies,
  cosDependencies,
  coshDependencies,
  divideDependencies,
  expDependencies,
  maxDependencies,
  minDependencies,
  multiplyDependencies,
  parseDependencies,
  piDependencies,
  powDependencies,
  sinDependencies,
  sinhDependencies,
  sqrtDependencies,
  subtractDependencies,
  tanDependencies,
  tanhDependencies,
  unaryMinusDependencies,
  unitDependencies,
}

/** The typings leave it open whether a part is there; all of these are. */
const isPart = (part: unknown): part is FactoryFunctionMap => part !== undefined

/** The small mathjs that formulas of a sheet are evaluated with. */
export const math = create(Object.assign({}, ...Object.values(PARTS).filter(isPart)))

math.import({ agm, integral, series }, {})

const parsed = new Map<string, MathNode>()

/** Parses a formula once: a sheet uses each several times, and there are a few dozen of them. */
export function parseFormula(expression: string): MathNode {
  const known = parsed.get(expression)
  if (known) return known
  const node = math.parse(expression)
  parsed.set(expression, node)
  return node
}
