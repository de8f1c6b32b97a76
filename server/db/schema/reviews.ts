import { index, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { pieces } from './parts'
import { people } from './people'
import { readings } from './readings'

export const reviewRemarks = sqliteTable(
  'review_remarks',
  {
    id: text('id').primaryKey(),
    readingId: text('reading_id')
      .notNull()
      .references(() => readings.id),
    authorId: text('author_id')
      .notNull()
      .references(() => people.id),
    text: text('text').notNull(),
    /** Where in the photograph, photo pixels; null for a remark on the whole. */
    place: text('place', { mode: 'json' }).$type<{ x: number; y: number }>(),
    createdAt: text('created_at').notNull(),
    closedById: text('closed_by_id').references(() => people.id),
    closedAt: text('closed_at'),
  },
  (table) => [index('review_remarks_reading').on(table.readingId, table.createdAt)],
)

export const remarkAnswers = sqliteTable(
  'remark_answers',
  {
    id: text('id').primaryKey(),
    remarkId: text('remark_id')
      .notNull()
      .references(() => reviewRemarks.id),
    authorId: text('author_id')
      .notNull()
      .references(() => people.id),
    text: text('text').notNull(),
    createdAt: text('created_at').notNull(),
  },
  (table) => [index('remark_answers_remark').on(table.remarkId, table.createdAt)],
)

/** What is done with a piece that doesn't conform, or of which neither is proven; the latest counts. */
export const dispositions = sqliteTable(
  'dispositions',
  {
    id: text('id').primaryKey(),
    pieceId: text('piece_id')
      .notNull()
      .references(() => pieces.id),
    readingId: text('reading_id')
      .notNull()
      .references(() => readings.id),
    kind: text('kind').$type<'rework' | 'concession' | 'reject'>().notNull(),
    reason: text('reason').notNull(),
    /** Who granted a concession; empty for the others. */
    onWordOf: text('on_word_of').notNull().default(''),
    decidedById: text('decided_by_id')
      .notNull()
      .references(() => people.id),
    decidedAt: text('decided_at').notNull(),
  },
  (table) => [index('dispositions_piece').on(table.pieceId, table.decidedAt)],
)
