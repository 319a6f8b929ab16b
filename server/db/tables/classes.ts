import { index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { ClassScene } from '../../../shared/schemas/class'
import { accounts } from './accounts'

/** One class a row, until it has expired: a restart of the server loses nothing. */
export const classes = sqliteTable(
  'classes',
  {
    id: text().primaryKey(),
    /** What phones type; without signs that look alike. */
    code: text().notNull().unique(),
    openedBy: text('opened_by')
      .notNull()
      .references(() => accounts.id),
    openedAt: integer('opened_at').notNull(),
    expiresAt: integer('expires_at').notNull(),
    closedAt: integer('closed_at'),
    /** Counts what the trainer told. */
    step: integer().notNull().default(0),
    /** Where the trainer is; null before the first scene. */
    scene: text({ mode: 'json' }).$type<ClassScene>(),
  },
  (table) => [index('classes_by_trainer').on(table.openedBy)],
)

/** What a phone guessed in a scene. The phone is a number that it drew itself; nothing else is kept. */
export const classGuesses = sqliteTable(
  'class_guesses',
  {
    classId: text('class_id')
      .notNull()
      .references(() => classes.id, { onDelete: 'cascade' }),
    /** Course and scene. */
    scene: text().notNull(),
    participant: text().notNull(),
    value: real().notNull(),
  },
  (table) => [primaryKey({ columns: [table.classId, table.scene, table.participant] })],
)
