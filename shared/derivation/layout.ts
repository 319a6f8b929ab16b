import type {
  ConstantNode,
  FunctionNode,
  MathNode,
  OperatorNode,
  ParenthesisNode,
  SymbolNode,
} from 'mathjs'
import type { PrintedNumber } from './figures'
import { parseFormula } from './math'

/** A number with its unit inside a formula. */
export interface FigureBox extends PrintedNumber {
  readonly kind: 'figure'
  readonly unit: string
}

/** A formula as it stands on paper, before it is written in one notation or another. */
export type Box =
  | { readonly kind: 'symbol'; readonly id: string }
  | FigureBox
  | { readonly kind: 'row'; readonly items: readonly (Box | string)[] }
  | { readonly kind: 'fraction'; readonly over: Box; readonly under: Box }
  | { readonly kind: 'power'; readonly base: Box; readonly exponent: Box }
  | { readonly kind: 'root'; readonly of: Box }
  /** `isLong`: may be broken over two lines, so that its brackets do not grow. */
  | { readonly kind: 'brackets'; readonly of: Box; readonly isLong?: true }
  | { readonly kind: 'function'; readonly name: string; readonly args: readonly Box[] }
  | {
      readonly kind: 'integral'
      readonly of: Box
      readonly variable: Box
      readonly from: Box
      readonly to: Box
    }
  | { readonly kind: 'series'; readonly of: Box; readonly variable: Box; readonly from: string }
  | { readonly kind: 'extreme'; readonly name: 'max' | 'min'; readonly of: Box }

/** Turns the name of a quantity into a box: its symbol, or its figure. */
export type ShowSymbol = (id: string) => Box

/** How a product is written: with a dot between numbers, with nothing between symbols. */
export type ProductSign = '*' | ' '

interface Style {
  readonly show: ShowSymbol
  readonly product: ProductSign
}

/** Lays out a mathjs expression. */
export function layOut(expression: string, show: ShowSymbol, product: ProductSign = ' '): Box {
  return box(parseFormula(expression), { show, product })
}

function box(node: MathNode, style: Style): Box {
  switch (node.type) {
    case 'SymbolNode':
      return style.show((node as SymbolNode).name)
    case 'ConstantNode':
      return plain(String((node as ConstantNode).value))
    case 'ParenthesisNode':
      return box((node as ParenthesisNode).content, style)
    case 'FunctionNode':
      return functionBox(node as FunctionNode, style)
    case 'OperatorNode':
      return operatorBox(node as unknown as AnyOperator, style)
    default:
      throw new Error(`${node.type} cannot be laid out`)
  }
}

type AnyOperator = Pick<OperatorNode, 'type'> & { op: string; args: MathNode[] }

function plain(digits: string): Box {
  return { kind: 'figure', digits, exponent: 0, unit: '' }
}

function row(...items: readonly (Box | string)[]): Box {
  return { kind: 'row', items }
}

function operatorBox({ op, args }: AnyOperator, style: Style): Box {
  const [first, second] = args as [MathNode, MathNode | undefined]
  if (second === undefined) return row('−', bracketed(first, style, isSum))
  switch (op) {
    case '/':
      return quotient(box(first, style), box(second, style))
    case '^':
      return { kind: 'power', base: powerBase(first, style), exponent: box(second, style) }
    case '*':
      return row(
        bracketed(first, style, isSum),
        style.product,
        bracketed(second, style, isSumOrSigned),
      )
    case '-':
      return row(box(first, style), '−', bracketed(second, style, isSum))
    case '<=':
      return row(box(first, style), '≤', box(second, style))
    default:
      return row(box(first, style), '+', bracketed(second, style, isSigned))
  }
}

/** Width in characters from which a numerator is set beside its fraction, in brackets. */
const LONG = 58

/** A long sum over a number becomes that fraction of the sum, which can be broken. */
function quotient(over: Box, under: Box): Box {
  const isNumber = under.kind === 'figure' && under.unit === ''
  if (!isNumber || widthOf(over) < LONG) return { kind: 'fraction', over, under }
  const share: Box = { kind: 'fraction', over: plain('1'), under }
  return row(share, ' ', { kind: 'brackets', of: over, isLong: true })
}

/** About how many characters a formula takes on one line. */
function widthOf(part: Box | string): number {
  if (typeof part === 'string') return 2
  switch (part.kind) {
    case 'symbol':
      return Math.min(3, part.id.length)
    case 'figure':
      return part.digits.length + part.unit.length
    case 'row':
      return part.items.reduce((width, item) => width + widthOf(item), 0)
    case 'fraction':
      return Math.max(widthOf(part.over), widthOf(part.under))
    case 'function':
      return part.name.length + 2 + part.args.reduce((width, arg) => width + widthOf(arg), 0)
    case 'power':
      return widthOf(part.base) + widthOf(part.exponent)
    case 'integral':
    case 'series':
      return widthOf(part.of) + 5
    default:
      return widthOf(part.of) + 2
  }
}

function inner(node: MathNode): MathNode {
  return node.type === 'ParenthesisNode' ? inner((node as ParenthesisNode).content) : node
}

function operatorOf(node: MathNode): { op: string; isUnary: boolean } | null {
  const bare = inner(node)
  if (bare.type !== 'OperatorNode') return null
  const { op, args } = bare as unknown as AnyOperator
  return { op, isUnary: args.length === 1 }
}

function isSum(node: MathNode): boolean {
  const operator = operatorOf(node)
  return operator !== null && !operator.isUnary && (operator.op === '+' || operator.op === '-')
}

function isSigned(node: MathNode): boolean {
  return operatorOf(node)?.isUnary ?? false
}

function isSumOrSigned(node: MathNode): boolean {
  return isSum(node) || isSigned(node)
}

function bracketed(node: MathNode, style: Style, needs: (node: MathNode) => boolean): Box {
  const of = box(node, style)
  const isNegative = of.kind === 'figure' && of.digits.startsWith('−')
  if (!needs(node) && !isNegative) return of
  return widthOf(of) < LONG ? { kind: 'brackets', of } : { kind: 'brackets', of, isLong: true }
}

/** A power needs brackets around everything but one symbol or a bare positive number. */
function powerBase(node: MathNode, style: Style): Box {
  const of = box(node, style)
  const isBare =
    of.kind === 'symbol' ||
    (of.kind === 'figure' && of.unit === '' && of.exponent === 0 && !of.digits.startsWith('−'))
  return isBare ? of : { kind: 'brackets', of }
}

function functionBox(node: FunctionNode, style: Style): Box {
  const name = (node.fn as unknown as SymbolNode).name
  const args = node.args
  const [first, second, third, fourth] = args as [MathNode, MathNode, MathNode, MathNode]
  const bound = (variable: MathNode): Style => {
    const own = variable.toString()
    return { ...style, show: (id) => (id === own ? { kind: 'symbol', id } : style.show(id)) }
  }
  switch (name) {
    case 'sqrt':
      return { kind: 'root', of: box(first, style) }
    case 'integral':
      return {
        kind: 'integral',
        of: box(first, bound(second)),
        variable: { kind: 'symbol', id: second.toString() },
        from: box(third, style),
        to: box(fourth, style),
      }
    case 'series': {
      const variable: Box = { kind: 'symbol', id: second.toString() }
      const [from, step] = [third.toString(), fourth.toString()]
      const terms = step === '1' ? `${from}, 2, …` : `${from}, 3, …`
      return { kind: 'series', of: box(first, bound(second)), variable, from: terms }
    }
    case 'largest':
    case 'smallest':
      return {
        kind: 'extreme',
        name: name === 'largest' ? 'max' : 'min',
        of: row({ kind: 'symbol', id: 'h' }, ':', box(second, bound(first))),
      }
    default:
      return { kind: 'function', name, args: args.map((arg) => box(arg, style)) }
  }
}
