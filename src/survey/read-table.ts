import Papa from 'papaparse'

/** Signs that part cells. */
export const DELIMITERS = [',', ';', '\t', '|'] as const
export type Delimiter = (typeof DELIMITERS)[number]

/** A row of a file, and the line on which it begins. */
export interface TableRow {
  readonly line: number
  readonly cells: readonly string[]
}

export interface SurveyTable {
  readonly rows: readonly TableRow[]
  readonly delimiter: Delimiter
  /** Most cells in one row. */
  readonly columns: number
  /** Line on which a quotation mark is opened and never closed; null where none is. */
  readonly brokenAt: number | null
}

/** Lines that are looked at to find out what parts the cells. */
const SAMPLE = 40

/** Takes the text of a file apart. Empty lines are left out, and lines keep their numbers. */
export function readTable(text: string, delimiter: Delimiter = delimiterOf(text)): SurveyTable {
  const { data, errors } = Papa.parse<string[]>(text, { delimiter, skipEmptyLines: false })
  const rows: TableRow[] = []
  let line = 1
  for (const cells of data) {
    const here = line
    line += 1 + cells.reduce((sum, cell) => sum + breaksIn(cell), 0)
    const trimmed = cells.map((cell) => cell.trim())
    if (trimmed.some((cell) => cell !== '')) rows.push({ line: here, cells: trimmed })
  }
  const broken = errors.find(({ type, code }) => type === 'Quotes' && code === 'MissingQuotes')
  return {
    rows,
    delimiter,
    columns: Math.max(0, ...rows.map(({ cells }) => cells.length)),
    brokenAt: broken ? (rows[rows.length - 1]?.line ?? 1) : null,
  }
}

function breaksIn(cell: string): number {
  return cell.match(/\r\n|\r|\n/g)?.length ?? 0
}

/** The sign that parts most lines into one and the same number of cells, two or more. */
export function delimiterOf(text: string): Delimiter {
  const sample = text.split(/\r\n|\r|\n/, SAMPLE).join('\n')
  const scores = DELIMITERS.map((delimiter) => ({ delimiter, score: scoreOf(sample, delimiter) }))
  return scores.reduce((a, b) => (b.score > a.score ? b : a)).delimiter
}

function scoreOf(sample: string, delimiter: Delimiter): number {
  const { data } = Papa.parse<string[]>(sample, { delimiter, skipEmptyLines: 'greedy' })
  const counts = new Map<number, number>()
  for (const { length } of data) counts.set(length, (counts.get(length) ?? 0) + 1)
  const [columns = 1, lines = 0] = [...counts].sort((a, b) => b[1] - a[1] || b[0] - a[0])[0] ?? []
  if (columns < 2) return 0
  // A comma that parts cells and one that stands for a decimal point look alike: other signs go first.
  return (lines / data.length) * (delimiter === ',' ? 0.9 : 1) + columns / 1000
}
