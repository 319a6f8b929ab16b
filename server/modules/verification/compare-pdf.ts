import { sheetSchema, type Sheet } from '../../../shared/schemas/sheet'
import type { VerifiedFile } from '../../../shared/schemas/verification'
import { answerCover } from '../../../shared/sheet/answer-cover'
import { digestText } from '../../../shared/sheet/sheet-digest'
import { readCode } from '../../../shared/sheet/verification-code'
import { changeRows } from '../../../shared/sheet/change-rows'
import { sheetChanges } from '../../../shared/sheet/sheet-changes'
import { sheetWords } from '../../../shared/sheet/sheet-words'
import type { ReadPdf } from './read-pdf'

type Differences = VerifiedFile['differences']

/** A long list helps nobody: the first of them show what was done. */
const MOST_SHOWN = 40

/** Print and merge programs set blanks anew; words without them stay what they were. */
const compact = (text: string) => text.replace(/[\s\u00a0\u202f\u00ad]+/g, '')

/** Sheets that travel inside a PDF. */
export function attachedSheets({ attachments }: ReadPdf): readonly Sheet[] {
  return attachments.flatMap((text) => {
    try {
      const parsed = sheetSchema.safeParse(JSON.parse(text))
      return parsed.success ? [parsed.data] : []
    } catch {
      return []
    }
  })
}

const CODE = /verify\/([0-9A-Z]{4}-[0-9A-Z]{4}-[0-9A-Z]{4})/gi

/** Codes that a PDF bears: in a sheet inside it first, then in the words of its pages. */
export function codesIn(pdf: ReadPdf): readonly string[] {
  const attached = attachedSheets(pdf).map(({ verification }) => verification?.code ?? '')
  const printed = pdf.pages.flatMap((page) =>
    [...compact(page).matchAll(CODE)].map(([, code = '']) => code),
  )
  return [...new Set([...attached, ...printed].flatMap((code) => readCode(code) ?? []))]
}

/**
 * What differs between a sheet as it was issued and as a PDF has it: in the file inside, in figures of
 * the pages that bear its code, and in the sentences of its answer.
 */
export function differencesIn(pdf: ReadPdf, content: Sheet, issued: ReadPdf): Differences {
  const code = content.verification?.code ?? ''
  const attached = attachedSheets(pdf).filter(({ verification }) => verification?.code === code)
  const inside = attached.flatMap((sheet) => insideDifferences(content, sheet))
  const pages = pdf.pages.filter((page) => compact(page).includes(code))
  return [
    ...inside,
    ...pageDifferences(pages, issued.pages),
    ...wordDifferences(pages, content),
  ].slice(0, MOST_SHOWN)
}

function insideDifferences(issued: Sheet, found: Sheet): Differences {
  if (digestText(issued) === digestText(found)) return []
  const words = sheetWords(issued.units, issued.datum)
  const listed = changeRows(sheetChanges(issued, found), words).map(({ name, before, after }) => ({
    where: name,
    issued: before,
    found: after,
  }))
  // Names and dates are left out of the list of figures, and count all the same.
  return listed.length > 0 ? listed : [{ where: 'sheet.json', issued: '', found: '' }]
}

const FIGURE = /\d[\d.,\u202f]*/g
const PAGE = /Page(\d+)of(\d+)/

/** Figures of the page with the same number; what is missing stands beside what is new. */
function pageDifferences(found: readonly string[], issued: readonly string[]): Differences {
  const byNumber = new Map(issued.map((page) => [PAGE.exec(compact(page))?.[0], page]))
  return found.flatMap((page) => {
    const label = PAGE.exec(compact(page))?.[0]
    const ours = label === undefined ? undefined : byNumber.get(label)
    if (ours === undefined || compact(ours) === compact(page)) return []
    const [missing, added] = apart(figuresOf(ours), figuresOf(page))
    const count = Math.max(missing.length, added.length)
    return Array.from({ length: count }, (_, i) => ({
      where: label!.replace(/(\d+)of(\d+)/, ' $1 of $2'),
      issued: missing[i] ?? '',
      found: added[i] ?? '',
    }))
  })
}

function figuresOf(page: string): readonly string[] {
  return page.match(FIGURE) ?? []
}

/** What only one of two lists has, each as often as it is missing in the other. */
function apart(a: readonly string[], b: readonly string[]): [string[], string[]] {
  const rest = [...b]
  const onlyA = a.filter((figure) => {
    const at = rest.indexOf(figure)
    if (at >= 0) rest.splice(at, 1)
    return at < 0
  })
  return [onlyA, rest]
}

/** The sentences that somebody relies on, where the first page is there. */
function wordDifferences(pages: readonly string[], content: Sheet): Differences {
  const first = pages.find((page) => PAGE.exec(compact(page))?.[1] === '1')
  if (first === undefined) return []
  const { answer, leave, conditions } = answerCover(content)
  return [answer, leave, ...conditions]
    .filter((sentence) => !compact(first).includes(compact(sentence)))
    .map((sentence) => ({ where: 'Page 1', issued: sentence, found: '' }))
}
