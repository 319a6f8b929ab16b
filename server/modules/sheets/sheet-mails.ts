import type { Db } from '../../db/client'
import { composeMail, type MailKind } from '../../mail/compose-mail'
import { queueMail } from '../../mail/mail-queue'
import { permissionsOf } from '../accounts/permissions'
import { findProject } from '../projects/projects.queries'
import { listIssues, listReachableMembers } from './checking.queries'
import { nameOf } from './open-sheet'
import type { SheetWork } from './sheet-work'
import type { SheetRow } from './sheets.queries'

type Member = ReturnType<typeof listReachableMembers>[number]

export interface Notice {
  readonly kind: Extract<MailKind, `sheet${string}`>
  readonly row: SheetRow
  readonly at: number
  /** Who made the move. */
  readonly by: { readonly accountId: string; readonly name: string }
  readonly reason?: string
}

/** Puts the mails of a move into the queue, in its transaction; sending never blocks it. */
export function queueNotice(tx: Db, work: SheetWork, notice: Notice): void {
  const { kind, row, at, by, reason = '' } = notice
  const project = findProject(tx, row.projectId)?.name ?? ''
  const link = new URL(`/sheets/${row.id}`, work.appUrl).href
  for (const { name, email, isMember } of readersOf(tx, notice)) {
    const values = { name, sheet: nameOf(row), project, by: by.name, reason }
    // Whoever has no account reads the open page instead.
    const open = new URL(`/verify/${row.code ?? ''}`, work.appUrl).href
    const filling = { appUrl: work.appUrl, link: isMember ? link : open, values }
    queueMail(tx, work.mail, at, { recipient: email, ...composeMail(kind, filling) })
  }
}

interface Reader {
  readonly name: string
  readonly email: string
  readonly isMember: boolean
}

function readersOf(tx: Db, { kind, row, by }: Notice): readonly Reader[] {
  const members = listReachableMembers(tx, row.projectId).filter(({ id }) => id !== by.accountId)
  const concerned = members.filter((member) => isConcerned(member, kind, row))
  const known = concerned.flatMap(({ name, email }) =>
    email === null ? [] : [{ name, email, isMember: true }],
  )
  return kind === 'sheetSuperseded' ? [...known, ...issuedTo(tx, row, known)] : known
}

function isConcerned(member: Member, kind: Notice['kind'], row: SheetRow): boolean {
  const { id, organisationId } = member
  if (kind === 'sheetReview') {
    const isOther = row.category !== 3 || organisationId !== row.preparedFor
    return permissionsOf(member).mayCheck && id !== row.preparedBy && isOther
  }
  if (kind === 'sheetChecked') return permissionsOf(member).mayApprove && id !== row.preparedBy
  if (kind === 'sheetReturned') return id === row.preparedBy
  return [row.preparedBy, row.checkedBy, row.approvedBy].includes(id)
}

const ADDRESS = /[^\s<>"']+@[^\s<>"']+\.[^\s<>"']+/

/** Those on the issue list who stand there with an address for mail. */
function issuedTo(tx: Db, row: SheetRow, known: readonly Reader[]): readonly Reader[] {
  const told = new Set(known.map(({ email }) => email))
  return listIssues(tx, row.id).flatMap(({ recipient }) => {
    const email = ADDRESS.exec(recipient)?.[0].toLowerCase()
    if (email === undefined || told.has(email)) return []
    told.add(email)
    const name = recipient.replace(ADDRESS, '').replace(/[<>"]/g, '').trim()
    return [{ name: name === '' ? email : name, email, isMember: false }]
  })
}
