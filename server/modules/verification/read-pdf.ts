import {
  getDocument,
  type PDFDocumentLoadingTask,
  type PDFDocumentProxy,
} from 'pdfjs-dist/legacy/build/pdf.mjs'

/** What can be read from a PDF, whoever wrote it. */
export interface ReadPdf {
  /** Words of each page, in the order in which they are drawn. */
  readonly pages: readonly string[]
  /** Text of each file that travels inside. */
  readonly attachments: readonly string[]
}

/** A merged report may be long; past this, pages are not read. */
const MOST_PAGES = 400

/** Larger files inside are none of ours. */
const LARGEST_ATTACHMENT = 16_000_000

/** Opens a PDF; whatever stands in it runs nothing and loads nothing. */
export function openPdf(bytes: Uint8Array): PDFDocumentLoadingTask {
  return getDocument({
    // The reader takes the bytes away from whoever gave them.
    data: Uint8Array.from(bytes),
    isEvalSupported: false,
    disableFontFace: true,
    useSystemFonts: false,
    stopAtErrors: false,
    verbosity: 0,
  })
}

/** Reads words and attachments; null where the bytes are no PDF, or one behind a password. */
export async function readPdf(bytes: Uint8Array): Promise<ReadPdf | null> {
  const task = openPdf(bytes)
  try {
    const document = await task.promise
    return { pages: await pagesOf(document), attachments: await attachmentsOf(document) }
  } catch {
    return null
  } finally {
    await task.destroy()
  }
}

async function pagesOf(document: PDFDocumentProxy): Promise<readonly string[]> {
  const pages: string[] = []
  for (let number = 1; number <= Math.min(document.numPages, MOST_PAGES); number += 1) {
    const page = await document.getPage(number)
    const { items } = await page.getTextContent()
    pages.push(items.map((item) => ('str' in item ? item.str : '')).join(' '))
    page.cleanup()
  }
  return pages
}

async function attachmentsOf(document: PDFDocumentProxy): Promise<readonly string[]> {
  const found = ((await document.getAttachments()) ?? {}) as Record<string, { content?: unknown }>
  return Object.values(found).flatMap(({ content }) =>
    content instanceof Uint8Array && content.length <= LARGEST_ATTACHMENT
      ? [Buffer.from(content).toString('utf8')]
      : [],
  )
}
