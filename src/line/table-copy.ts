/** A table as it goes into a report: as a table where that is possible, and as text with tabs. */
export interface CopiedTable {
  readonly html: string
  readonly text: string
}

/** Writes a table for the clipboard. */
export function tableForReport(
  head: readonly string[],
  rows: readonly (readonly string[])[],
): CopiedTable {
  const row = (tag: string, cells: readonly string[]) =>
    `<tr>${cells.map((cell) => `<${tag}>${escaped(cell)}</${tag}>`).join('')}</tr>`
  const body = rows.map((cells) => row('td', cells)).join('')
  const html = `<table border="1"><thead>${row('th', head)}</thead><tbody>${body}</tbody></table>`
  const text = [head, ...rows].map((cells) => cells.map(plain).join('\t')).join('\n')
  return { html, text }
}

function escaped(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;')
}

/** Tabs and lines would break the table; spaces that do not break are plain in a text. */
function plain(text: string): string {
  return text.replace(/[\t\r\n]+/g, ' ').replace(/[\u00a0\u202f]/g, ' ')
}

/** Puts a table on the clipboard: as a table, else as text; false where the browser bars both. */
export async function copyTable({ html, text }: CopiedTable): Promise<'table' | 'text' | 'barred'> {
  const clipboard = navigator.clipboard as Clipboard | undefined
  if (!clipboard) return 'barred'
  if ('ClipboardItem' in window) {
    const item = new ClipboardItem({
      'text/html': new Blob([html], { type: 'text/html' }),
      'text/plain': new Blob([text], { type: 'text/plain' }),
    })
    const isCopied = await clipboard.write([item]).then(
      () => true,
      () => false,
    )
    if (isCopied) return 'table'
  }
  return clipboard.writeText(text).then(
    () => 'text' as const,
    () => 'barred' as const,
  )
}
