import type { Sheet } from '../schemas/sheet'
import { coverOf } from './cover'
import { sheetWords } from './sheet-words'

/** What a sheet answers, in the words of its cover; without its derivation. */
export function answerCover(sheet: Sheet) {
  const { verdict, answer, subject, leave, conditions } = coverOf(
    sheet,
    sheetWords(sheet.units, sheet.datum),
  )
  return { verdict: verdict.id, answer, subject, leave, conditions }
}
