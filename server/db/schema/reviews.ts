import { index, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
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
  },
  (table) => [index('review_remarks_reading').on(table.readingId, table.createdAt)],
)

export const certificates = sqliteTable(
  'certificates',
  {
    id: text('id').primaryKey(),
    number: text('number').notNull(),
    pieceId: text('piece_id')
      .notNull()
      .references(() => pieces.id),
    readingId: text('reading_id')
      .notNull()
      .references(() => readings.id),
    state: text('state').$type<'issued' | 'withdrawn' | 'replaced'>().notNull(),
    issuedById: text('issued_by_id')
      .notNull()
      .references(() => people.id),
    issuedAt: text('issued_at').notNull(),
  },
  (table) => [
    uniqueIndex('certificates_number').on(table.number),
    index('certificates_piece').on(table.pieceId),
    index('certificates_reading').on(table.readingId),
  ],
)
