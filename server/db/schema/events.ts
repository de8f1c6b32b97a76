import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { EventKind, EventSubject } from '../event-kinds'
import { people } from './people'

/**
 * Append-only trail: triggers refuse UPDATE, DELETE, and a row that doesn't follow on the last one.
 * `hash` covers everything in the row and the hash before it.
 */
export const events = sqliteTable(
  'events',
  {
    seq: integer('seq').primaryKey(),
    at: text('at').notNull(),
    /** null for what the program itself did. */
    actorId: text('actor_id').references(() => people.id),
    /** The name as it was then. */
    actorName: text('actor_name').notNull(),
    kind: text('kind').$type<EventKind>().notNull(),
    subjectType: text('subject_type').$type<EventSubject>().notNull(),
    subjectId: text('subject_id').notNull(),
    data: text('data', { mode: 'json' }).$type<Record<string, unknown>>().notNull(),
    prevHash: text('prev_hash').notNull(),
    hash: text('hash').notNull(),
  },
  (table) => [index('events_subject').on(table.subjectType, table.subjectId, table.seq)],
)
