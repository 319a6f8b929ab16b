import { plainNumber, significant } from '../derivation/figures'
import { sheetUnit } from '../derivation/sheet-units'
import { changeName, type ChangeName, type ChangePart } from './change-names'
import type { Difference } from './sheet-changes'
import type { SheetWords } from './sheet-words'

/** One changed field in words, with units. */
export interface ChangeRow {
  readonly part: ChangePart
  readonly name: string
  readonly before: string
  readonly after: string
}

/** Figures that are printed of a changed quantity. */
const SHOWN = 4

/**
 * Changed fields as a person reads them: inputs first, then results, then words. What changed within a
 * list, or within the survey of the line, is one row.
 */
export function changeRows(
  differences: readonly Difference[],
  words: SheetWords,
): readonly ChangeRow[] {
  const seen = new Set<string>()
  const rows = differences.flatMap(({ path, before, after }): ChangeRow[] => {
    const found = changeName(path)
    if (!found) return [{ part: 'words', name: path, ...plain(before, after) }]
    const { id, part, name } = found
    if (seen.has(id)) return []
    seen.add(id)
    const isInput = part === 'inputs'
    const shown = name.keys.map((key) => words.say(key)).join(', ')
    if (id !== path) return [{ part, name: shown, ...withinList(words) }]
    return [
      {
        ...{ part, name: shown },
        before: valueWords(before, { ...name, isInput }, words),
        after: valueWords(after, { ...name, isInput }, words),
      },
    ]
  })
  const order: readonly ChangePart[] = ['inputs', 'results', 'words']
  return order.flatMap((part) => rows.filter((row) => row.part === part))
}

function plain(before: Difference['before'], after: Difference['after']) {
  return { before: String(before ?? ''), after: String(after ?? '') }
}

function withinList({ say }: SheetWords) {
  return { before: say('sheet.change.asBefore'), after: say('sheet.change.changed') }
}

function valueWords(
  value: Difference['before'],
  { kind, words: keyOf, isInput }: ChangeName & { readonly isInput: boolean },
  { say, show, system }: SheetWords,
): string {
  if (value === null || value === '') return say('sheet.change.none')
  if (typeof value === 'number' && kind === 'percent') return show(value, 'percent')
  if (typeof value === 'number' && kind === 'length') return show(value, 'length')
  if (typeof value === 'number' && kind !== null && kind !== 'percent') {
    const { factor, label } = sheetUnit(kind, system)
    const digits = plainNumber(significant(value / factor, SHOWN))
    // An input was entered as it is; zeros behind it would say more than is known.
    const shown = isInput ? digits.replace(/(\.\d*?)0+$/, '$1').replace(/\.$/, '') : digits
    return label === '' ? shown : `${shown}\u00a0${label}`
  }
  // "global-1.5" is a key with a dot in it.
  return keyOf ? say(keyOf(String(value).replace('.', '-'))) : String(value)
}
