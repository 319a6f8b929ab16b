import {
  DerivationDisagreementError,
  type DisagreementReason,
} from '../../../shared/derivation/disagreement'
import type { Sheet } from '../../../shared/schemas/sheet'
import { ConflictError } from '../../errors'
import { toCsv } from '../../http/csv'
import type { SentError } from '../../threads/task-messages'
import { createTaskThread, plainError } from '../../threads/task-thread'
import type { SheetTasks } from '../../typesetting/sheet-tasks'
import type { IssuedOrder } from '../../typesetting/typeset-order'
import { TypesettingError } from '../../typesetting/typesetting-error'

/**
 * What needs the derivation or the typesetter. Both are large and take long, so they live in a thread
 * of their own, which begins with the first sheet: nobody waits for the sheet of somebody else.
 */

const thread = createTaskThread<SheetTasks>(
  new URL('../../typesetting/sheet-thread.ts', import.meta.url),
  revived,
)

function revived(error: SentError): Error {
  if (error.name === 'TypesettingError') return new TypesettingError(error.message)
  if (error.name !== 'DerivationDisagreementError') return plainError(error)
  const { lineNumber, lineId, reason, detail } = error.fields as unknown as Disagreement
  return new DerivationDisagreementError(lineNumber, lineId, reason, detail)
}

interface Disagreement {
  readonly lineNumber: string
  readonly lineId: string
  readonly reason: DisagreementReason
  readonly detail: string
}

/** Documents that nobody changed since they were last asked for. */
const MOST_KEPT = 6
const documents = new Map<string, Promise<Buffer>>()

/** A line that does not agree stops the sheet and names itself. */
async function agreeing<Result>(composed: Promise<Result>): Promise<Result> {
  try {
    return await composed
  } catch (error) {
    if (!(error instanceof DerivationDisagreementError)) throw error
    throw new ConflictError(`There is no sheet: ${error.message}`)
  }
}

/** Loads everything before somebody waits for it. */
export async function warmComposing(): Promise<void> {
  await thread.run('warm', null)
}

/** Ends the thread. */
export async function stopComposing(): Promise<void> {
  await thread.stop()
}

/** @throws ConflictError that names the line that does not agree. */
export async function assertDerives(sheet: Sheet): Promise<void> {
  await agreeing(thread.run('check', sheet))
}

/** Numbers of the lines of a sheet, and the unrounded figure of each in its printed unit. */
export function linesOf(sheet: Sheet): Promise<ReadonlyMap<string, number>> {
  return thread.run('lines', sheet)
}

async function setSheet(sheet: Sheet): Promise<Buffer> {
  const { buffer, byteOffset, byteLength } = await agreeing(thread.run('pdf', sheet))
  return Buffer.from(buffer, byteOffset, byteLength)
}

/**
 * A sheet that is not frozen as PDF.
 *
 * @param key Names sheet, version and status; the same key gives the same bytes.
 */
export function documentOf(key: string, sheet: Sheet): Promise<Buffer> {
  const found = documents.get(key)
  if (found) return found
  const made = setSheet(sheet)
  documents.set(key, made)
  // What could not be set is tried again.
  made.catch(() => documents.delete(key))
  const [oldest] = documents.keys()
  if (documents.size > MOST_KEPT && oldest !== undefined) documents.delete(oldest)
  return made
}

/** How many pages a PDF of our typesetter has; it writes their number beside their root. */
const PAGES = /\/Type \/Pages\s+\/Count (\d+)/

interface FrozenPdf {
  readonly pdf: Buffer
  readonly pages: number
}

/** The final document. */
export async function frozenDocument(sheet: Sheet): Promise<FrozenPdf> {
  return counted(await setSheet(sheet))
}

/** A deployment order, final from the start. */
export async function frozenOrder(issued: IssuedOrder): Promise<FrozenPdf> {
  const { buffer, byteOffset, byteLength } = await thread.run('order', issued)
  return counted(Buffer.from(buffer, byteOffset, byteLength))
}

function counted(pdf: Buffer): FrozenPdf {
  const pages = Number(PAGES.exec(pdf.toString('latin1'))?.[1] ?? 0)
  if (pages === 0) throw new Error('a document without pages was set')
  return { pdf, pages }
}

/** The derivation as CSV. */
export async function tableOf(sheet: Sheet): Promise<string> {
  return toCsv(await agreeing(thread.run('table', sheet)))
}
