import type { Derivation } from '../derivation/line'
import { CHECK_IDS, type CheckId } from '../schemas/check-ids'
import type { SectionResult } from '../schemas/section-result'
import { shownVerdict } from './cover'
import type { CheckRow } from './document'
import type { SheetWords } from './sheet-words'

/** The checks of a result, one row each, with the line that gives it. */
export function checkRows(
  result: SectionResult,
  { lines }: Derivation,
  words: SheetWords,
): readonly CheckRow[] {
  return CHECK_IDS.flatMap((id) => {
    const check = result[id]
    if (!check) return []
    const line = lines.find(({ check: of, group }) => of === id && group !== 'level')
    const { required, utilisation, verdict } = check
    const isHeight = id === 'freeboard'
    return [
      {
        name: words.say(`checks.name.${id}`),
        found: foundOf(result, id, words),
        needed:
          required === null ? dash(words) : words.show(required, isHeight ? 'length' : 'ratio'),
        used: utilisation === null ? dash(words) : usedShare(words, utilisation),
        verdict: shownVerdict(words, verdict),
        line: line?.number ?? '',
        governs: result.governs === id,
      },
    ]
  })
}

function dash(words: SheetWords): string {
  return words.say('sheet.noFigure')
}

/** A share used; above 1 it is rounded up, so that a check that fails never shows 100 %. */
export function usedShare(words: SheetWords, utilisation: number): string {
  return words.show(utilisation, 'percent', utilisation > 1 ? 'up' : undefined)
}

function foundOf(result: SectionResult, id: CheckId, words: SheetWords): string {
  if (id === 'freeboard') {
    const { available } = result.freeboard
    return available === null ? dash(words) : words.show(available, 'length')
  }
  const { factor = null, verdict } = result[id] ?? {}
  // What fails never shows the factor that it needs.
  const rounding = verdict === 'fails' ? 'down' : undefined
  return factor === null ? dash(words) : words.show(factor, 'ratio', rounding)
}
