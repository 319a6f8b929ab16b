import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { ACCOUNT_ROLES } from '../../../shared/access/roles'
import { UNIT_SYSTEMS } from '../../../shared/units'

/** Moments are milliseconds since 1970, UTC. */
const moment = (name: string) => integer(name)
const flag = (name: string) => integer(name, { mode: 'boolean' })

export const organisations = sqliteTable('organisations', {
  id: text().primaryKey(),
  name: text().notNull().unique(),
  createdAt: moment('created_at').notNull(),
})

export const accounts = sqliteTable('accounts', {
  id: text().primaryKey(),
  /** Lower case; null once it was erased. The name stays, for signatures. */
  email: text().unique(),
  name: text().notNull(),
  organisationId: text('organisation_id')
    .notNull()
    .references(() => organisations.id),
  role: text({ enum: ACCOUNT_ROLES }).notNull(),
  mayCheck: flag('may_check').notNull().default(false),
  mayApprove: flag('may_approve').notNull().default(false),
  registrationNumber: text('registration_number').notNull().default(''),
  timeZone: text('time_zone').notNull().default('UTC'),
  unitSystem: text('unit_system', { enum: UNIT_SYSTEMS }).notNull().default('metric'),
  passwordHash: text('password_hash'),
  createdAt: moment('created_at').notNull(),
  deactivatedAt: moment('deactivated_at'),
})

/** Sessions of the library behind server/auth: it owns the first three columns. */
export const sessions = sqliteTable(
  'sessions',
  {
    id: text().primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => accounts.id),
    /** Seconds since 1970. */
    expiresAt: integer('expires_at').notNull(),
    createdAt: moment('created_at').notNull(),
    userAgent: text('user_agent').notNull().default(''),
  },
  (table) => [index('sessions_by_account').on(table.userId)],
)

/** Tokens are stored as hashes: who reads the database cannot use them. */
export const invitations = sqliteTable('invitations', {
  id: text().primaryKey(),
  tokenHash: text('token_hash').notNull().unique(),
  email: text().notNull(),
  name: text().notNull().default(''),
  role: text({ enum: ACCOUNT_ROLES }).notNull(),
  mayCheck: flag('may_check').notNull().default(false),
  mayApprove: flag('may_approve').notNull().default(false),
  organisationId: text('organisation_id')
    .notNull()
    .references(() => organisations.id),
  /** Null: the one-time link of the first administrator. */
  invitedBy: text('invited_by').references(() => accounts.id),
  createdAt: moment('created_at').notNull(),
  expiresAt: moment('expires_at').notNull(),
  acceptedAt: moment('accepted_at'),
  revokedAt: moment('revoked_at'),
})

export const passwordResets = sqliteTable('password_resets', {
  id: text().primaryKey(),
  tokenHash: text('token_hash').notNull().unique(),
  accountId: text('account_id')
    .notNull()
    .references(() => accounts.id),
  createdAt: moment('created_at').notNull(),
  expiresAt: moment('expires_at').notNull(),
  usedAt: moment('used_at'),
})

/** Failed attempts by key (address or sender), so that guessing slows down. */
export const attempts = sqliteTable('attempts', {
  key: text().primaryKey(),
  count: integer().notNull(),
  lastAt: moment('last_at').notNull(),
})

/** Who, what, when, from which version to which. Triggers refuse change and deletion. */
export const auditEntries = sqliteTable(
  'audit_entries',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    at: moment('at').notNull(),
    actorId: text('actor_id'),
    /** As it was then. */
    actorName: text('actor_name').notNull(),
    action: text().notNull(),
    subjectType: text('subject_type').notNull(),
    subjectId: text('subject_id').notNull(),
    subjectName: text('subject_name').notNull().default(''),
    projectId: text('project_id'),
    fromVersion: integer('from_version'),
    toVersion: integer('to_version'),
    detail: text({ mode: 'json' }).$type<Record<string, unknown>>().notNull(),
  },
  (table) => [index('audit_by_project').on(table.projectId, table.id)],
)

export const MAIL_STATES = ['waiting', 'sent', 'kept', 'failed'] as const

/** Mail on its way out; `kept` is the local outbox where no SMTP server is set. */
export const mails = sqliteTable(
  'mails',
  {
    id: text().primaryKey(),
    recipient: text().notNull(),
    subject: text().notNull(),
    text: text().notNull(),
    html: text().notNull(),
    state: text({ enum: MAIL_STATES }).notNull(),
    tries: integer().notNull().default(0),
    nextTryAt: moment('next_try_at'),
    lastError: text('last_error').notNull().default(''),
    createdAt: moment('created_at').notNull(),
    sentAt: moment('sent_at'),
  },
  (table) => [index('mails_by_state').on(table.state, table.nextTryAt)],
)
