import { fileURLToPath } from 'node:url'
import { NodeCompiler } from '@myriaddreamin/typst-ts-node-compiler'
import { readFonts } from './fonts'
import { TypesettingError } from './typesetting-error'

/** A file that travels inside the PDF. */
export interface Attachment {
  readonly name: string
  readonly mediaType: string
  readonly text: string
  readonly description: string
}

/** What a template gets. It sees this, its own folder, and nothing else. */
export interface TypesetInput {
  /** Read by the template as JSON. */
  readonly data: unknown
  readonly attachments?: readonly Attachment[]
  /** Pictures by the name under which the data speak of them. */
  readonly pictures?: ReadonlyMap<string, Uint8Array>
}

export interface Typesetter {
  /**
   * Sets a document: PDF/A-3a, tagged, same input same bytes.
   *
   * @param template Name of a file in `templates/`, without its ending.
   * @throws TypesettingError where the template does not compile with these data.
   */
  readonly typeset: (template: string, input: TypesetInput) => Buffer
}

const TEMPLATES = fileURLToPath(new URL('templates/', import.meta.url))

/** Archivable, tagged, with files inside. */
const STANDARD = 'a-3a'

/** Layouts that stay in memory for so many documents. */
const KEPT = 8

/** One compiler with its fonts; it takes some hundredths of a second to make, so keep it. */
export function createTypesetter(): Typesetter {
  const compiler = NodeCompiler.create({
    workspace: TEMPLATES,
    fontArgs: [{ fontBlobs: readFonts() }],
  })
  return { typeset: (template, input) => typesetWith(compiler, template, input) }
}

function typesetWith(compiler: NodeCompiler, template: string, input: TypesetInput): Buffer {
  const pictures = [...(input.pictures ?? [])].map(
    ([name, bytes]) => [`${TEMPLATES}${name}`, Buffer.from(bytes)] as const,
  )
  try {
    for (const [path, bytes] of pictures) compiler.mapShadow(path, bytes)
    const compiled = compiler.compile({
      mainFilePath: `${TEMPLATES}${template}.typ`,
      inputs: {
        data: JSON.stringify(input.data),
        attachments: JSON.stringify(input.attachments ?? []),
      },
    })
    if (!compiled.result) throw new TypesettingError(reasonOf(compiler, compiled.takeDiagnostics()))
    return withoutSuspects(compiler.pdf(compiled.result, { pdfStandard: STANDARD }))
  } finally {
    for (const [path] of pictures) compiler.unmapShadow(path)
    compiler.evictCache(KEPT)
  }
}

function reasonOf(
  compiler: NodeCompiler,
  diagnostics: Parameters<NodeCompiler['fetchDiagnostics']>[0] | null,
): string {
  const found: { message?: string; path?: string }[] = diagnostics
    ? compiler.fetchDiagnostics(diagnostics)
    : []
  const lines = found.map(({ message = '', path = '' }) => `${path.split('/').at(-1)}: ${message}`)
  return lines.join('\n') || 'the document could not be set'
}

/**
 * The mark "no suspect tags" is allowed and says nothing, but a widespread reader reports it as an
 * error. It is overwritten with blanks, so that no place in the file moves.
 */
function withoutSuspects(pdf: Buffer): Buffer {
  const mark = '/Suspects false'
  const at = pdf.indexOf(mark)
  if (at >= 0) pdf.write(' '.repeat(mark.length), at, 'latin1')
  return pdf
}
