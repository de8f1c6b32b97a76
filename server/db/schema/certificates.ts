import type { CertificateSnapshot, CertificateState } from '@shared/schemas/certificates'
import {
  type AnySQLiteColumn,
  blob,
  index,
  integer,
  sqliteTable,
  text,
  uniqueIndex,
} from 'drizzle-orm/sqlite-core'
import { pieces } from './parts'
import { people } from './people'
import { readings } from './readings'

/** What was issued is never changed (a trigger says so); only whether it still stands is. */
export const certificates = sqliteTable(
  'certificates',
  {
    id: text('id').primaryKey(),
    year: integer('year').notNull(),
    /** Counts the certificates of a year from 1, without a gap. */
    count: integer('count').notNull(),
    number: text('number').notNull(),
    checkCode: text('check_code').notNull(),
    pieceId: text('piece_id')
      .notNull()
      .references(() => pieces.id),
    readingId: text('reading_id')
      .notNull()
      .references(() => readings.id),
    state: text('state').$type<CertificateState>().notNull(),
    issuedById: text('issued_by_id')
      .notNull()
      .references(() => people.id),
    issuedAt: text('issued_at').notNull(),
    replacesId: text('replaces_id').references((): AnySQLiteColumn => certificates.id),
    endedById: text('ended_by_id').references(() => people.id),
    endedAt: text('ended_at'),
    /** Why it was withdrawn; what replaces it is found by `replacesId`. */
    withdrawalReason: text('withdrawal_reason'),
    pdfSha256: text('pdf_sha256').notNull(),
    snapshot: text('snapshot', { mode: 'json' }).$type<CertificateSnapshot>().notNull(),
  },
  (table) => [
    uniqueIndex('certificates_number').on(table.number),
    uniqueIndex('certificates_year_count').on(table.year, table.count),
    uniqueIndex('certificates_check_code').on(table.checkCode),
    index('certificates_issued').on(table.issuedAt, table.id),
    index('certificates_piece').on(table.pieceId),
    index('certificates_reading').on(table.readingId),
    uniqueIndex('certificates_replaces').on(table.replacesId),
  ],
)

/** The printed certificates, beside their rows in the same database: neither is ever without the other. */
export const certificatePdfs = sqliteTable('certificate_pdfs', {
  certificateId: text('certificate_id')
    .primaryKey()
    .references(() => certificates.id),
  pdf: blob('pdf', { mode: 'buffer' }).notNull(),
})
