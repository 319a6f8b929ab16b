/** What a cell may hold; nothing is an empty cell. */
export type CsvCell = string | number | boolean | null | undefined

/** Signs with which a spreadsheet begins a formula, or a cell that it runs as one. */
const FORMULA_START = /^[=+\-@\t\r\n]/

/**
 * Rows as CSV of RFC 4180: commas, CRLF, quotation marks where they are needed, in UTF-8 with a byte
 * order mark, so that spreadsheets read it as such. A text that a spreadsheet would take for a formula
 * gets an apostrophe in front; a number never does.
 */
export function toCsv(rows: readonly (readonly CsvCell[])[]): string {
  return `\uFEFF${rows.map((row) => `${row.map(cellText).join(',')}\r\n`).join('')}`
}

function cellText(cell: CsvCell): string {
  if (cell === null || cell === undefined) return ''
  if (typeof cell !== 'string') return String(cell)
  const safe = startsFormula(cell) ? `'${cell}` : cell
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}

/** Some spreadsheets skip leading blanks, and read the wide forms of the signs as the signs. */
function startsFormula(text: string): boolean {
  return FORMULA_START.test(text) || /^\s*[=+\-@＝＋－＠]/u.test(text)
}
