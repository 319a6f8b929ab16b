import { deriveSection } from '../derivation/derive-section'
import type { Derivation } from '../derivation/line'
import { referencesOf } from '../derivation/sources'
import { verifyDerivation } from '../derivation/verify-derivation'
import { checkBasis } from '../catalogue/check-bases'
import type { Sheet } from '../schemas/sheet'
import { sheetTexts } from '../texts/sheet.en'
import { checkRows } from './check-rows'
import { checkingChapter } from './checking-chapter'
import { coverOf } from './cover'
import { decidesOf } from './decides'
import type { Chapter, SheetDocument } from './document'
import { factorDrawing, pressureDrawing, sectionDrawing } from './drawings'
import { inputRows } from './input-rows'
import { lineChapter } from './line-chapter'
import { lineGroups } from './line-rows'
import { sheetWords, type SheetWords } from './sheet-words'

const CAUTIONS = ['guarantee', 'codes', 'leave', 'people', 'ground', 'power'] as const
const ROLES = ['prepared', 'checked', 'approved'] as const

/** The derivation of a sheet, from its frozen case and result. */
export function derivationOf(sheet: Sheet): Derivation {
  return deriveSection(sheet.case, sheet.result, {
    system: sheet.units,
    groundLevel: sheet.groundLevel,
    leave: sheet.leave,
    gripShare: sheet.gripShare,
  })
}

/**
 * A sheet in words, formulas and drawings. The derivation is computed a second time on the way.
 *
 * @param chapters Chapters that other parts of the program add, after that of the line.
 * @throws DerivationDisagreementError that names the line that does not agree: then there is no sheet.
 */
export function composeSheet(sheet: Sheet, chapters: readonly Chapter[] = []): SheetDocument {
  const words = sheetWords(sheet.units, sheet.datum)
  const derivation = derivationOf(sheet)
  const counts = verifyDerivation(derivation)
  const { number, revision, project, place } = sheet
  const step = words.system === 'metric' ? '1 mm' : '0.01 ft'
  return {
    title: words.say('sheet.title', { number, revision }),
    language: 'en',
    date: sheet.date,
    paper: sheet.paper,
    band: words.say(`sheet.band.${sheet.status}`),
    head: { project: project.name, place, number, revision },
    letterhead: sheet.letterhead,
    cover: coverOf(sheet, words),
    checks: checkRows(sheet.result, derivation, words),
    section: sectionDrawing(sheet, words),
    pressures: pressureDrawing(sheet, words),
    factors: factorDrawing(sheet, words),
    groups: lineGroups(derivation, sheet.result, words),
    proofs: words.say('sheet.proofs', { ...counts, step }),
    omitted: omittedOf(sheet, words),
    decides: decidesOf(sheet, words),
    decidesNotes: [words.say('sheet.decides.judgement'), words.say('sheet.decides.adverse')],
    chapters: [
      ...(sheet.line ? [lineChapter(sheet.line, words)] : []),
      ...chapters,
      ...(sheet.checking ? [checkingChapter(sheet.checking, derivation, words)] : []),
    ],
    assumptions: assumptionsOf(sheet, words),
    inputs: inputRows(derivation, sheet, words),
    references: referencesFor(sheet, derivation),
    cautions: CAUTIONS.map((caution) => words.say(`shell.cautions.${caution}`)),
    method: methodOf(sheet, words),
    approvals: ROLES.map((role) => ({
      role: words.say(`sheet.role.${role}`),
      person: sheet.people[role],
    })),
    verification: sheet.verification,
    photographs: sheet.photographs,
    attachment: words.say('sheet.attachment'),
    words: sheetTexts.word,
  }
}

function omittedOf({ result }: Sheet, { say }: SheetWords): string {
  const { current, wave, debris, dry } = result.thrust
  const absent = [
    current === 0 ? say('sheet.omitted.current') : '',
    wave === 0 ? say('sheet.omitted.waves') : '',
    debris === 0 ? say('sheet.omitted.debris') : '',
    dry === 0 ? say('sheet.omitted.dry') : '',
  ].filter((name) => name !== '')
  return absent.length === 0 ? '' : say('sheet.omitted.lead', { list: absent.join(', ') })
}

function assumptionsOf(sheet: Sheet, { say, show }: SheetWords): SheetDocument['assumptions'] {
  const { case: section, assumptions } = sheet
  const confirm = say('sheet.assumption.tag')
  const model = say(`checks.upliftModel.${section.uplift.model}`).toLowerCase()
  const share = show(section.uplift.edgeFactor, 'percent')
  return [
    {
      text: say('sheet.assumption.friction', { friction: show(section.ground.friction, 'ratio') }),
      tag: confirm,
    },
    { text: say('sheet.assumption.skirtEdge', { model, share }), tag: confirm },
    { text: say('sheet.assumption.rigid'), tag: '' },
    { text: say('sheet.assumption.membrane'), tag: '' },
    ...(section.basis === 'partial-ec7'
      ? [{ text: say('sheet.assumption.level'), tag: confirm }]
      : []),
    ...assumptions.map(({ text, isToBeConfirmed }) => ({
      text,
      tag: isToBeConfirmed ? confirm : '',
    })),
  ]
}

function referencesFor({ case: section }: Sheet, { lines }: Derivation): readonly string[] {
  const { source, edition } = checkBasis(section.basis)
  const basis = `${source.charAt(0).toUpperCase()}${source.slice(1)}. ${edition}.`
  return [...new Set([basis, ...referencesOf(lines.map((line) => line.source))])]
}

function methodOf({ software }: Sheet, { say }: SheetWords): readonly string[] {
  return [
    say('sheet.method.engine'),
    say('sheet.method.holdsTo'),
    say('sheet.method.attached'),
    ...(software === '' ? [] : [say('sheet.method.software', { software })]),
  ]
}
