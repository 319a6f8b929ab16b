import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { VerifiedFile, VerifiedSheet } from '../../../shared/schemas/verification'
import { answerCover } from '../../../shared/sheet/answer-cover'
import { readCode } from '../../../shared/sheet/verification-code'
import { beginAttempt, forgiveAttempt } from '../../auth/attempts/attempts'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import type { FileStore } from '../../files/file-store'
import { listMoves } from '../sheets/checking.queries'
import type { SheetWork } from '../sheets/sheet-work'
import {
  findSheetByCode,
  findSheetByFile,
  listRevisions,
  type SheetRow,
} from '../sheets/sheets.queries'
import type { ReadPdf } from './read-pdf'

const ROLES = ['prepared', 'checked', 'approved'] as const

/**
 * The sheet of a code. Whoever guesses is slowed down; whoever knows a code is not.
 *
 * @throws NotFoundError; TooManyRequestsError after many codes that do not exist.
 */
export function sheetOfCode(work: SheetWork, typed: string, sender: string): SheetRow {
  const attempt = beginAttempt(work, { purpose: 'verify', target: typed.slice(0, 40), sender })
  const code = readCode(typed)
  const row = code === null ? undefined : findSheetByCode(work.db, code)
  if (!row) {
    throw new NotFoundError(
      `code: "${typed.slice(0, 40)}" is none of ours. It has twelve signs in groups of four.`,
    )
  }
  forgiveAttempt(work.db, attempt)
  return row
}

/** What anybody may know of an issued sheet: no names of people, organisations only. */
export function verified(db: Db, row: SheetRow): VerifiedSheet {
  const { content, number, revision, status, pages, digest, fileSha256 } = row
  const { verdict, answer, subject, leave, conditions } = answerCover(content)
  const signatures = ROLES.flatMap((role) => {
    const person = content.people[role]
    return person ? [{ role, organisation: person.organisation, date: person.date }] : []
  })
  return {
    code: row.code ?? '',
    title: content.place,
    project: content.project.name,
    client: content.project.client,
    ...{ number, revision, status, verdict, answer, subject, leave },
    supersededBy: status === 'superseded' ? successorOf(db, row) : null,
    withdrawnBecause: status === 'withdrawn' ? reasonOf(db, row) : '',
    conditions: [...conditions],
    issuedAt: row.issuedAt ?? row.updatedAt,
    signatures,
    ...{ digest, fileSha256, pages },
  }
}

function successorOf(db: Db, row: SheetRow): VerifiedSheet['supersededBy'] {
  const later = listRevisions(db, row.projectId, row.number).filter(
    ({ issuedAt }) => issuedAt !== null && issuedAt >= (row.issuedAt ?? 0),
  )
  const newest = later.filter(({ id }) => id !== row.id).at(-1)
  if (!newest || newest.issuedAt === null) return null
  return { revision: newest.revision, issuedAt: newest.issuedAt }
}

function reasonOf(db: Db, row: SheetRow): string {
  return listMoves(db, row.id).findLast(({ move }) => move === 'withdraw')?.reason ?? ''
}

/**
 * Says what a file is: ours, ours no longer as it was, changed, or none of ours.
 *
 * @throws TooManyRequestsError after many files that are none of ours.
 */
export async function verifyFile(
  work: SheetWork,
  bytes: Buffer,
  sender: string,
): Promise<VerifiedFile> {
  const { db } = work
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const attempt = beginAttempt(work, { purpose: 'verify', target: sha256, sender })
  const same = findSheetByFile(db, sha256)
  const answer = same
    ? { answer: 'issued' as const, sheet: verified(db, same), differences: [] }
    : await comparedFile(work, bytes)
  if (answer.answer !== 'unknown') forgiveAttempt(db, attempt)
  return answer
}

const UNKNOWN: VerifiedFile = { answer: 'unknown', sheet: null, differences: [] }

async function comparedFile(work: SheetWork, bytes: Buffer): Promise<VerifiedFile> {
  // The reader is large, and few who verify upload a file.
  const { readPdf } = await import('./read-pdf')
  const { codesIn, differencesIn } = await import('./compare-pdf')
  const pdf = await readPdf(bytes)
  if (!pdf) return UNKNOWN
  for (const code of codesIn(pdf)) {
    const row = findSheetByCode(work.db, code)
    if (!row) continue
    const issued = (await issuedPdf(work, row, readPdf)) ?? { pages: [], attachments: [] }
    const differences = differencesIn(pdf, row.content, issued)
    const answer = differences.length > 0 ? 'changed' : 'not-the-file'
    return { answer, sheet: verified(work.db, row), differences: [...differences] }
  }
  return UNKNOWN
}

async function issuedPdf(
  { store }: SheetWork,
  row: SheetRow,
  read: (bytes: Uint8Array) => Promise<ReadPdf | null>,
): Promise<ReadPdf | null> {
  return read(await issuedBytes(store, row))
}

/** @throws NotFoundError where the bytes are gone, as after a restore without the folder of files. */
async function issuedBytes(store: FileStore, { fileId, number }: SheetRow): Promise<Buffer> {
  if (fileId === null || !(await store.holds(fileId, 'original'))) {
    throw new NotFoundError(`sheet: the file of ${number} is missing on the server`)
  }
  return readFile(join(store.folder, store.nameOf(fileId, 'original')))
}

/**
 * A page of an issued sheet as PNG.
 *
 * @throws NotFoundError for a page that it does not have.
 */
export async function pictureOfPage(
  { store }: SheetWork,
  row: SheetRow,
  page: string,
): Promise<Buffer> {
  const number = /^[1-9]\d{0,3}$/.test(page) ? Number(page) : 0
  if (number < 1 || number > row.pages) {
    throw new NotFoundError(`page: "${page}" does not exist of this sheet`)
  }
  // Reader and canvas are large, and only pictures need both.
  const { pagePicture } = await import('./page-picture')
  return pagePicture(row.fileSha256, number, () => issuedBytes(store, row))
}
