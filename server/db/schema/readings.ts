import type { Marks } from '@shared/schemas/marks'
import type { Conditions, Photo, ReadingSetUp } from '@shared/schemas/readings'
import type { Verdict } from '@shared/schemas/results'
import type { ReadingState } from '@shared/workflow/reading-states'
import { type AnySQLiteColumn, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { faces, pieces } from './parts'
import { people } from './people'
import { results } from './results'

// JSON columns stand last: SQLite then leaves their overflow pages unread when a list asks for the others.

export const readings = sqliteTable(
  'readings',
  {
    id: text('id').primaryKey(),
    pieceId: text('piece_id')
      .notNull()
      .references(() => pieces.id),
    faceId: text('face_id')
      .notNull()
      .references(() => faces.id),
    /** Counts the readings of this face of this piece, from 1. */
    number: integer('number').notNull(),
    state: text('state').$type<ReadingState>().notNull(),
    takenById: text('taken_by_id')
      .notNull()
      .references(() => people.id),
    correctsId: text('corrects_id').references((): AnySQLiteColumn => readings.id),
    latestResultId: text('latest_result_id').references((): AnySQLiteColumn => results.id),
    sentBackReason: text('sent_back_reason'),
    setAsideCause: text('set_aside_cause'),
    sentAt: text('sent_at'),
    /** Why leave-outs or edge band differ from the drawing's; null while they don't. */
    departureReason: text('departure_reason'),
    /** The piece was lapped since the reading before: earlier ones count no more. */
    lappedSince: integer('lapped_since', { mode: 'boolean' }).notNull().default(false),
    agreedById: text('agreed_by_id').references(() => people.id),
    agreedAt: text('agreed_at'),
    /** Of the latest result, kept here so that the archive finds readings by it along an index. */
    verdict: text('verdict').$type<Verdict>(),
    createdAt: text('created_at').notNull(),
    updatedAt: text('updated_at').notNull(),
    marksVersion: integer('marks_version').notNull().default(0),
    marksSavedAt: text('marks_saved_at'),
    marksSavedById: text('marks_saved_by_id').references(() => people.id),
    setUp: text('set_up', { mode: 'json' }).$type<ReadingSetUp>().notNull(),
    conditions: text('conditions', { mode: 'json' }).$type<Conditions>().notNull(),
    marks: text('marks', { mode: 'json' }).$type<Marks>().notNull(),
  },
  (table) => [
    uniqueIndex('readings_piece_face_number').on(table.pieceId, table.faceId, table.number),
    // With piece and face in it, a search passes over readings that don't match without opening them.
    index('readings_created').on(table.createdAt, table.id, table.pieceId, table.faceId),
    index('readings_state_created').on(table.state, table.createdAt, table.id),
    index('readings_taker_created').on(table.takenById, table.createdAt, table.id),
    index('readings_piece_created').on(table.pieceId, table.createdAt, table.id),
    index('readings_face').on(table.faceId),
    index('readings_taker_state').on(table.takenById, table.state, table.createdAt, table.id),
    index('readings_verdict').on(
      table.verdict,
      table.createdAt,
      table.id,
      table.state,
      table.pieceId,
      table.faceId,
    ),
  ],
)

export const photos = sqliteTable('photos', {
  sha256: text('sha256').primaryKey(),
  format: text('format').notNull(),
  /** After EXIF orientation. */
  widthPx: integer('width_px').notNull(),
  heightPx: integer('height_px').notNull(),
  bitDepth: integer('bit_depth').notNull(),
  channels: integer('channels').notNull(),
  bytes: integer('bytes').notNull(),
  createdAt: text('created_at').notNull(),
})

export const readingPhotos = sqliteTable(
  'reading_photos',
  {
    id: text('id').primaryKey(),
    readingId: text('reading_id')
      .notNull()
      .references(() => readings.id),
    sha256: text('sha256')
      .notNull()
      .references(() => photos.sha256),
    role: text('role').$type<Photo['role']>().notNull(),
    fileName: text('file_name').notNull(),
    addedAt: text('added_at').notNull(),
    addedById: text('added_by_id')
      .notNull()
      .references(() => people.id),
  },
  (table) => [
    uniqueIndex('reading_photos_once').on(table.readingId, table.sha256),
    index('reading_photos_first').on(table.readingId, table.role, table.addedAt),
    index('reading_photos_sha256').on(table.sha256),
  ],
)
