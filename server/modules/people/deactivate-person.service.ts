import type { Person } from '../../../shared/schemas/account'
import { endAllSessions } from '../../auth/sessions.queries'
import type { Db } from '../../db/client'
import { ConflictError } from '../../errors'
import type { SignedIn } from '../../http/operation'
import { unknownIn } from '../../http/unknown-reference'
import type { ServerParts } from '../../parts'
import { updateAccount } from '../accounts/accounts.queries'
import { recordAudit } from '../audit/record-audit'
import { eraseInvitedAddress } from '../invitations/invitations.queries'
import { deleteMailsTo } from '../mails/mails.queries'
import { voidResets } from '../password-resets/password-resets.queries'
import { listLedProjects, makeLead, makeReader } from './hand-over.queries'
import { findPerson } from './people.queries'
import { about, assertIsActive, assertSomebodyAdministers, readPerson } from './people.service'

type Parts = Pick<ServerParts, 'db' | 'now'>

/**
 * Ends an account: no sign-in, no session, no open link. Every project that the person leads gets the
 * successor as lead; signatures, memberships and the audit trail stay, with the name.
 *
 * @throws NotFoundError; ConflictError for oneself, the last administrator, or projects without a
 * successor; OutOfRangeError for a successor who cannot lead.
 */
export function deactivatePerson(
  { db, now }: Parts,
  actor: SignedIn,
  id: string,
  handOverTo: string | null,
): Person {
  return db.transaction((tx) => {
    const person = readPerson(tx, id)
    assertIsActive(person)
    if (id === actor.accountId) {
      throw new ConflictError('person: nobody deactivates themselves; ask another administrator')
    }
    assertSomebodyAdministers(tx, person, false)
    const at = now()
    if (handOverTo === null) assertNothingIsLeft(person)
    else handOver({ db: tx, at, actor }, person, successorOf(tx, id, handOverTo))
    updateAccount(tx, id, { deactivatedAt: at })
    endAllSessions(tx, id)
    voidResets(tx, id, at)
    recordAudit(tx, actor, at, { ...about('person.deactivated', person), detail: { handOverTo } })
    return readPerson(tx, id)
  })
}

function assertNothingIsLeft({ leads }: Person): void {
  if (leads === 0) return
  const what = leads === 1 ? 'a project' : `${leads} projects`
  throw new ConflictError(`handOverTo: this person alone leads ${what}; name who leads from now on`)
}

/** An administrator sees no project without being asked in, and a viewer never leads one. */
function successorOf(db: Db, leaving: string, id: string): Person {
  const successor = id === leaving ? undefined : findPerson(db, id)
  const isAble =
    successor?.deactivatedAt === null && successor.role !== 'viewer' && successor.role !== 'admin'
  if (!isAble) {
    throw unknownIn('handOverTo', id, 'another active person, neither viewer nor administrator')
  }
  return successor
}

interface HandOver {
  readonly db: Db
  readonly at: number
  readonly actor: SignedIn
}

function handOver({ db, at, actor }: HandOver, from: Person, to: Person): void {
  for (const project of listLedProjects(db, from.id)) {
    makeLead(db, project.id, to.id, at)
    makeReader(db, project.id, from.id)
    recordAudit(db, actor, at, {
      action: 'project.handed-over',
      ...{ subjectType: 'project', subjectId: project.id, subjectName: project.name },
      projectId: project.id,
      detail: { from: from.name, to: to.name },
    })
  }
}

/**
 * Erases the address of somebody deactivated, wherever it stands. The name stays, for signatures.
 *
 * @throws NotFoundError; ConflictError if the person is active or the address is erased already.
 */
export function eraseAddress({ db, now }: Parts, actor: SignedIn, id: string): Person {
  return db.transaction((tx) => {
    const person = readPerson(tx, id)
    if (person.deactivatedAt === null) {
      throw new ConflictError('person: still active; an address is erased after deactivation')
    }
    if (person.email === null) throw new ConflictError('person: the address is erased already')
    updateAccount(tx, id, { email: null, passwordHash: null })
    eraseInvitedAddress(tx, person.email)
    deleteMailsTo(tx, person.email)
    recordAudit(tx, actor, now(), about('person.address-erased', person))
    return readPerson(tx, id)
  })
}
