import { z } from 'zod'
import { ACCOUNT_ROLES } from '../access/roles'
import { UNIT_SYSTEMS } from '../units'
import { listQuerySchema, momentSchema, nameSchema, pageOf } from './paging'

export const emailSchema = z.string().trim().toLowerCase().max(254).pipe(z.email())

/** Twelve characters and more: length beats rules about digits. */
export const passwordSchema = z.string().min(12).max(200)

export const timeZoneSchema = z
  .string()
  .max(60)
  .meta({ description: 'IANA time zone, such as Europe/Lisbon' })

/** `POST /api/session` */
export const signInSchema = z.strictObject({
  email: z.string().trim().toLowerCase().min(1).max(254),
  password: z.string().min(1).max(200),
})
export type SignIn = z.output<typeof signInSchema>

/** `GET /api/session`: whoever is signed in; `account: null` for nobody. */
export const accountSchema = z
  .strictObject({
    id: z.string(),
    email: z.string(),
    name: z.string(),
    organisation: z.strictObject({ id: z.string(), name: z.string() }),
    role: z.enum(ACCOUNT_ROLES),
    mayCheck: z.boolean(),
    mayApprove: z.boolean(),
    registrationNumber: z.string(),
    timeZone: timeZoneSchema,
    unitSystem: z.enum(UNIT_SYSTEMS),
  })
  .meta({ id: 'Account', description: 'A person who can sign in' })
export type Account = z.output<typeof accountSchema>

export const sessionAnswerSchema = z.strictObject({ account: accountSchema.nullable() })

/** `PATCH /api/account` */
export const accountChangeSchema = z.strictObject({
  name: nameSchema.optional(),
  registrationNumber: z.string().trim().max(60).optional(),
  timeZone: timeZoneSchema.optional(),
  unitSystem: z.enum(UNIT_SYSTEMS).optional(),
})
export type AccountChange = z.output<typeof accountChangeSchema>

/** `PUT /api/account/password`: ends the other sessions. */
export const passwordChangeSchema = z.strictObject({
  current: z.string().min(1).max(200),
  next: passwordSchema,
})
export type PasswordChange = z.output<typeof passwordChangeSchema>

/**
 * `GET /api/account/sessions`: open sessions of the account itself; `DELETE` there ends all of them,
 * `DELETE /api/account/sessions/:sessionId` ends one.
 */
export const ownSessionSchema = z.strictObject({
  id: z.string().meta({ description: 'A name for the session that cannot be used to sign in' }),
  createdAt: momentSchema,
  expiresAt: momentSchema,
  userAgent: z.string(),
  isThis: z.boolean(),
})
export const ownSessionsSchema = z.strictObject({ sessions: z.array(ownSessionSchema) })

/** `GET /api/demo-accounts`: only in demonstration mode, for the sign-in page. */
export const demoAccountsSchema = z.strictObject({
  accounts: z.array(
    z.strictObject({ email: z.string(), password: z.string(), name: z.string(), what: z.string() }),
  ),
})

/** `GET /api/invitations/:token` */
export const invitationViewSchema = z.strictObject({
  email: z.string().meta({ description: 'Empty: whoever accepts gives theirs' }),
  name: z.string(),
  organisation: z.string(),
  role: z.enum(ACCOUNT_ROLES),
  expiresAt: momentSchema,
})

/** `POST /api/invitations/:token`: accepts it, makes the account and signs in. */
export const invitationAcceptSchema = z.strictObject({
  name: nameSchema,
  password: passwordSchema,
  registrationNumber: z.string().trim().max(60).default(''),
  timeZone: timeZoneSchema.default('UTC'),
  unitSystem: z.enum(UNIT_SYSTEMS).default('metric'),
  email: emailSchema
    .optional()
    .meta({ description: 'Only where the invitation names none: the first administrator' }),
})
export type InvitationAccept = z.output<typeof invitationAcceptSchema>

/** `POST /api/password-resets`: always answered alike, whether the address is known or not. */
export const resetRequestSchema = z.strictObject({ email: emailSchema })
/** `GET /api/password-resets/:token`: whether the link still works. */
export const resetViewSchema = z.strictObject({ name: z.string(), expiresAt: momentSchema })
/** `POST /api/password-resets/:token`: ends all sessions of the account. */
export const resetAcceptSchema = z.strictObject({ password: passwordSchema })

/** `GET /api/admin/people` */
export const peopleQuerySchema = listQuerySchema.pick({ search: true, page: true }).extend({
  state: z.enum(['active', 'deactivated', 'any']).default('any'),
})
export type PeopleQuery = z.output<typeof peopleQuerySchema>
export const personSchema = z.strictObject({
  id: z.string(),
  email: z.string().nullable().meta({ description: 'Null once it was erased' }),
  name: z.string(),
  organisation: z.strictObject({ id: z.string(), name: z.string() }),
  role: z.enum(ACCOUNT_ROLES),
  mayCheck: z.boolean(),
  mayApprove: z.boolean(),
  createdAt: momentSchema,
  deactivatedAt: momentSchema.nullable(),
  leads: z.number().int().meta({ description: 'Projects that only this person leads' }),
})
export type Person = z.output<typeof personSchema>
export const peoplePageSchema = pageOf(personSchema)

/** `PATCH /api/admin/people/:accountId` */
export const personChangeSchema = z.strictObject({
  role: z.enum(ACCOUNT_ROLES).optional(),
  mayCheck: z.boolean().optional(),
  mayApprove: z.boolean().optional(),
  organisationId: z.string().optional(),
})
export type PersonChange = z.output<typeof personChangeSchema>

/**
 * `POST /api/admin/people/:accountId/deactivation`: projects go to a named person.
 * `DELETE /api/admin/people/:accountId/address` erases the address of somebody deactivated.
 */
export const deactivationSchema = z.strictObject({
  handOverTo: z.string().nullable().meta({ description: 'Account that leads from now on' }),
})

/** `POST /api/admin/invitations`; `DELETE /api/admin/invitations/:invitationId` revokes. */
export const newInvitationSchema = z.strictObject({
  email: emailSchema,
  name: z.string().trim().max(120).default(''),
  role: z.enum(ACCOUNT_ROLES),
  mayCheck: z.boolean().default(false),
  mayApprove: z.boolean().default(false),
  organisationId: z.string(),
})
export type NewInvitation = z.output<typeof newInvitationSchema>
export const invitationSchema = z.strictObject({
  id: z.string(),
  email: z.string(),
  name: z.string(),
  role: z.enum(ACCOUNT_ROLES),
  mayCheck: z.boolean(),
  mayApprove: z.boolean(),
  organisation: z.strictObject({ id: z.string(), name: z.string() }),
  createdAt: momentSchema,
  expiresAt: momentSchema,
  state: z.enum(['open', 'accepted', 'expired', 'revoked']),
})
export type Invitation = z.output<typeof invitationSchema>
export const invitationsSchema = z.strictObject({ invitations: z.array(invitationSchema) })

/** `GET, POST /api/admin/organisations` and `PATCH /api/admin/organisations/:organisationId` */
export const organisationSchema = z.strictObject({
  id: z.string(),
  name: z.string(),
  people: z.number().int(),
})
export type Organisation = z.output<typeof organisationSchema>
export const organisationsSchema = z.strictObject({ organisations: z.array(organisationSchema) })
export const organisationNameSchema = z.strictObject({ name: nameSchema })

/** `GET /api/admin/audit` and `GET /api/admin/audit.csv` */
export const auditEntrySchema = z.strictObject({
  id: z.number().int(),
  at: momentSchema,
  actorName: z.string(),
  action: z.string(),
  subjectType: z.string(),
  subjectId: z.string(),
  subjectName: z.string(),
  projectId: z.string().nullable(),
  fromVersion: z.number().int().nullable(),
  toVersion: z.number().int().nullable(),
  detail: z.record(z.string(), z.unknown()),
})
export type AuditEntry = z.output<typeof auditEntrySchema>
export const auditPageSchema = pageOf(auditEntrySchema)
export const auditQuerySchema = z.object({
  search: z.string().trim().max(100).default(''),
  action: z.string().trim().max(60).default(''),
  from: z.coerce.number().int().optional().meta({ description: 'Earliest moment, ms' }),
  to: z.coerce.number().int().optional().meta({ description: 'Latest moment, ms' }),
  page: z.coerce.number().int().min(1).max(100_000).default(1),
})
export type AuditQuery = z.output<typeof auditQuerySchema>

/**
 * `GET /api/admin/mails`; `GET /api/admin/mails/:mailId` gives the .eml file of a mail that was not
 * sent; `POST /api/admin/mails/:mailId/retry` puts it back into the queue.
 */
export const mailSchema = z.strictObject({
  id: z.string(),
  recipient: z.string(),
  subject: z.string(),
  state: z.enum(['waiting', 'sent', 'kept', 'failed']),
  tries: z.number().int(),
  lastError: z.string(),
  createdAt: momentSchema,
  sentAt: momentSchema.nullable(),
})
export type Mail = z.output<typeof mailSchema>
export const mailsQuerySchema = listQuerySchema.pick({ page: true })
export const mailsPageSchema = pageOf(mailSchema)
