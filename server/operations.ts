import type { Mode } from '../shared/schemas/health'
import type { Operation } from './http/operation'
import { accountsOperations } from './modules/accounts/accounts.routes'
import { demoAccountsOperations, sessionOperations } from './modules/accounts/session.routes'
import { auditOperations } from './modules/audit/audit.routes'
import { catalogueOperations } from './modules/catalogue/catalogue.routes'
import { classesOperations } from './modules/classes/classes.routes'
import { healthOperations } from './modules/health/health.routes'
import { invitationsOperations } from './modules/invitations/invitations.routes'
import { mailsOperations } from './modules/mails/mails.routes'
import { openapiOperations } from './modules/openapi/openapi.routes'
import { ordersOperations } from './modules/orders/orders.routes'
import { letterheadsOperations } from './modules/organisations/letterheads.routes'
import { organisationsOperations } from './modules/organisations/organisations.routes'
import { passwordResetsOperations } from './modules/password-resets/password-resets.routes'
import { peopleOperations } from './modules/people/people.routes'
import { sheetsOperations } from './modules/sheets/sheets.routes'
import { verificationOperations } from './modules/verification/verification.routes'
import { sectionChecksOperations } from './modules/section-checks/section-checks.routes'
import type { RouteParts } from './parts'
import { projectOperations } from './project-operations'

export interface Identity {
  readonly version: string
  readonly mode: Mode
}

/** Every route of the API. Whatever is not in this list does not exist. */
export function allOperations(
  parts: RouteParts,
  { version, mode }: Identity,
): readonly Operation[] {
  const sheetWork = { ...parts, software: `Toehold ${version}` }
  const operations = [
    ...healthOperations(parts.db, { version, mode }),
    ...catalogueOperations(parts.db),
    ...sectionChecksOperations(),
    ...sessionOperations(parts),
    ...demoAccountsOperations(parts, mode),
    ...accountsOperations(parts),
    ...invitationsOperations(parts),
    ...passwordResetsOperations(parts),
    ...peopleOperations(parts),
    ...organisationsOperations(parts),
    ...letterheadsOperations(parts),
    ...auditOperations(parts),
    ...mailsOperations(parts),
    ...projectOperations(parts),
    ...sheetsOperations(sheetWork),
    ...verificationOperations(sheetWork),
    ...ordersOperations(parts),
    ...classesOperations(parts),
  ]
  return [...operations, ...openapiOperations(version, operations)]
}
