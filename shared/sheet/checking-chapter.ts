import { plainNumber, printedNumber, significant } from '../derivation/figures'
import type { Derivation, DerivationLine } from '../derivation/line'
import { sheetUnit } from '../derivation/sheet-units'
import type { Checking } from '../schemas/sheet'
import type { Chapter, TableCell } from './document'
import type { SheetWords } from './sheet-words'

/**
 * The appendix of the check: how many lines were ticked, and what the checker worked out beside a line,
 * with the difference to the figure of the sheet.
 */
export function checkingChapter(
  { by, ticked, figures }: Checking,
  { lines }: Derivation,
  words: SheetWords,
): Chapter {
  const { say } = words
  const known = new Set(lines.map(({ number }) => number))
  const count = ticked.filter((number) => known.has(number)).length
  const rows = figures.flatMap((figure) => {
    const line = lines.find(({ number }) => number === figure.line)
    return line ? [figureRow(line, figure, words)] : []
  })
  const column = (name: string, isRight: boolean) => ({
    label: say(`sheet.checking.${name}`),
    isRight,
  })
  const table = {
    columns: [
      column('line', false),
      column('name', false),
      column('sheet', true),
      column('own', true),
      column('difference', true),
      column('note', false),
    ],
    rows,
  }
  return {
    id: 'checking',
    title: say('sheet.checking.title'),
    blocks: [
      { kind: 'text', text: say('sheet.checking.ticked', { by, count, of: lines.length }) },
      ...(rows.length === 0
        ? []
        : [{ kind: 'table', table, caption: say('sheet.checking.figures') } as const]),
    ],
  }
}

function figureRow(
  line: DerivationLine,
  { value, note }: Checking['figures'][number],
  { system, say, resolve }: SheetWords,
): readonly TableCell[] {
  const { label } = sheetUnit(line.result.kind, system)
  const unit = label === '' ? '' : `\u00a0${label}`
  return [
    line.number,
    resolve(line.name),
    plainNumber(printedNumber(line.result, system)) + unit,
    plainNumber(significant(value, 4)) + unit,
    differenceOf(line.result.value, value, say('sheet.checking.none')),
    note,
  ]
}

/** How far an own figure is from that of the sheet, in per cent of the latter. */
export function differenceOf(sheet: number, own: number, none: string): string {
  if (own === sheet) return none
  if (sheet === 0) return plainNumber(significant(own, 2))
  const percent = ((own - sheet) / Math.abs(sheet)) * 100
  const shown = plainNumber(significant(percent, 2))
  return `${percent > 0 ? '+' : ''}${shown}\u00a0%`
}
