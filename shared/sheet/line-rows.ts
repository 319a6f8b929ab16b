import type { Derivation, DerivationLine } from '../derivation/line'
import { isSearch } from '../derivation/holds-to-proof'
import { significant } from '../derivation/figures'
import { writeBox, type Written } from '../derivation/notation'
import { SHEET_SOURCES } from '../derivation/sources'
import { writeLine } from '../derivation/written-line'
import type { SectionResult } from '../schemas/section-result'
import { shownVerdict } from './cover'
import type { LineGroup, LineRow } from './document'
import type { SheetWords } from './sheet-words'

/** The derivation in groups, each line in words and formulas. */
export function lineGroups(
  derivation: Derivation,
  result: SectionResult,
  words: SheetWords,
): readonly LineGroup[] {
  const groups = [...new Set(derivation.lines.map(({ group }) => group))]
  return groups.map((id, place) => ({
    number: String(place + 1),
    title: words.say(`derivation.group.${id}`),
    lines: derivation.lines
      .filter(({ group }) => group === id)
      .map((line) => lineRow(line, result, words)),
  }))
}

function lineRow(line: DerivationLine, result: SectionResult, words: SheetWords): LineRow {
  const { symbolic, numeric, result: figure, residual } = writeLine(line, words.system)
  const source = SHEET_SOURCES[line.source]
  const tag = words.say(`sheet.tag.${source.tag}`)
  return {
    id: line.id,
    number: line.number,
    anchor: `line-${line.number.replace('.', '-')}`,
    name: words.resolve(line.name),
    note: isNoteDue(line) && line.note ? words.resolve(line.note) : '',
    source: tag === '' || source.reference === null ? source.short : `${source.short}, ${tag}`,
    symbolic,
    numeric,
    result: figure,
    proof: proofOf(line, words),
    residual: residual === null ? null : residualOf(residual),
    verdict: verdictOf(line, result, words),
  }
}

/** The note on soft ground belongs only to lines that know the undrained strength. */
function isNoteDue({ id, formula }: DerivationLine): boolean {
  return id !== 'slidingResistance' || formula.includes('c_u')
}

function proofOf({ proof, formula }: DerivationLine, { say }: SheetWords): string {
  if (proof === 'recomputed') return ''
  return say(isSearch(formula) ? 'sheet.proofSearch' : 'sheet.proof')
}

/** Less than a few units in the last place of a double is no figure. */
function residualOf(residual: number): Written {
  const shown = significant(Math.max(residual, 1e-15), 1)
  return writeBox({ kind: 'figure', ...shown, unit: '' })
}

function verdictOf(
  { check, id, group }: DerivationLine,
  result: SectionResult,
  words: SheetWords,
): LineRow['verdict'] {
  if (check === null || group === 'level' || !/Factor$|^freeboard$/.test(id)) return null
  const answer = result[check]
  if (!answer || answer.required === null) return null
  const kind = check === 'freeboard' ? 'length' : 'ratio'
  const required = words.show(answer.required, kind)
  return {
    ...shownVerdict(words, answer.verdict),
    needs: words.say('sheet.needs', { required }),
  }
}
