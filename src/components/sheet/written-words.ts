import type { DraftWords } from '@shared/schemas/sheet-api'

const lines = (text: string) =>
  text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '')

/** Words of a draft as somebody types them: lists as lines of a text. */
export interface WrittenWords {
  title: string
  project: string
  client: string
  site: string
  documents: string
  category: string
  purpose: string
  revisionReason: string
  conditions: string
  assumptions: string
  paper: DraftWords['paper']
  units: DraftWords['units']
  /** Captions of the photographs that are printed, by their file. */
  captions: Record<string, string>
}

/** Fields that a collision compares. */
export const WRITTEN_FIELDS = [
  'title',
  'project',
  'client',
  'site',
  'documents',
  'category',
  'purpose',
  'revisionReason',
  'conditions',
  'assumptions',
  'paper',
  'units',
] as const satisfies readonly (keyof WrittenWords)[]

export function writtenWords(words: DraftWords): WrittenWords {
  const { title, project, category, purpose, revisionReason, paper, units } = words
  const { name, client, site, documents } = project
  return {
    ...{ title, project: name, client, site, purpose, revisionReason, paper, units },
    documents: documents.map(({ label, number }) => `${label}: ${number}`).join('\n'),
    category: String(category),
    conditions: words.conditions.join('\n'),
    assumptions: words.assumptions
      .map(({ text, isToBeConfirmed }) => (isToBeConfirmed ? `${text} ?` : text))
      .join('\n'),
    captions: Object.fromEntries(
      words.photographs.map(({ fileId, caption }) => [fileId, caption] as const),
    ),
  }
}

const MOST_DOCUMENTS = 8

/** Document numbers of a text; null where a line has no name, colon and number. */
function documentsOf(text: string): DraftWords['project']['documents'] | null {
  const found = lines(text).map((line) => /^(.+?):\s*(\S.*)$/.exec(line))
  if (found.length > MOST_DOCUMENTS || found.includes(null)) return null
  return found.map((parts) => ({ label: parts![1]!.trim(), number: parts![2]!.trim() }))
}

/** What the server takes; null where the document numbers cannot be read. */
export function readWords(written: WrittenWords): Omit<DraftWords, 'inputSources'> | null {
  const documents = documentsOf(written.documents)
  if (documents === null) return null
  const { title, project: name, client, site, purpose, revisionReason, paper, units } = written
  return {
    ...{ title, purpose, revisionReason, paper, units },
    project: { name, client, site, documents },
    category: Number(written.category) as DraftWords['category'],
    conditions: lines(written.conditions),
    assumptions: lines(written.assumptions).map((line) => ({
      text: line.replace(/\s*\?$/, ''),
      isToBeConfirmed: line.endsWith('?'),
    })),
    photographs: Object.entries(written.captions).map(([fileId, caption]) => ({
      fileId,
      caption,
    })),
  }
}
