import type {
  Certificate,
  CertificateList,
  CertificateListQuery,
  CertificateRow,
} from '@shared/schemas/certificates'
import { and, count, desc, eq, inArray, or, type SQL, sql } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { cutPage, parsePageMark } from '../../db/paging'
import { piecesWith } from '../../db/reading-search'
import { certificates } from '../../db/schema/certificates'
import { customers, lots, parts, pieces } from '../../db/schema/parts'
import { people } from '../../db/schema/people'
import { readings } from '../../db/schema/readings'
import { results } from '../../db/schema/results'
import { contains, matchesEach } from '../../db/search-text'
import { notFound } from '../../errors'

const columns = {
  id: certificates.id,
  number: certificates.number,
  state: certificates.state,
  pieceId: certificates.pieceId,
  readingId: certificates.readingId,
  faceId: readings.faceId,
  partNumber: parts.number,
  partName: parts.name,
  serial: pieces.serial,
  lotNumber: lots.number,
  customerName: customers.name,
  // A certified reading is never changed, so that its latest result is the one that was certified.
  flatnessUm: sql<number>`${results.flatnessUm}`,
  expandedUncertaintyUm: sql<number>`${results.expandedUncertaintyUm}`,
  bandUm: sql<number>`${results.bandUm}`,
  verdict: results.verdict,
  issuedById: people.id,
  issuedByName: people.name,
  issuedAt: certificates.issuedAt,
  endedAt: certificates.endedAt,
  withdrawalReason: certificates.withdrawalReason,
}

/** Certificates, newest first. */
function selectRows(db: Connection, where: SQL | undefined, limit: number): CertificateRow[] {
  return db
    .select(columns)
    .from(certificates)
    .innerJoin(pieces, eq(pieces.id, certificates.pieceId))
    .innerJoin(parts, eq(parts.id, pieces.partId))
    .innerJoin(customers, eq(customers.id, parts.customerId))
    .leftJoin(lots, eq(lots.id, pieces.lotId))
    .innerJoin(people, eq(people.id, certificates.issuedById))
    .innerJoin(readings, eq(readings.id, certificates.readingId))
    .innerJoin(results, eq(results.id, readings.latestResultId))
    .where(where)
    .orderBy(desc(certificates.issuedAt), desc(certificates.id))
    .limit(limit)
    .all()
    .map(({ issuedById, issuedByName, ...row }) => ({
      ...row,
      issuedBy: { id: issuedById, name: issuedByName },
    }))
}

export function selectCertificatesOfPiece(db: Connection, pieceId: string): CertificateRow[] {
  return selectRows(db, eq(certificates.pieceId, pieceId), -1)
}

/** One certificate, what it replaces and what replaces it. */
export function selectCertificate(db: Connection, id: string): Certificate {
  const [row] = selectRows(db, eq(certificates.id, id), 1)
  const record = db.select().from(certificates).where(eq(certificates.id, id)).get()
  if (!row || !record) throw notFound('certificate')
  return {
    ...row,
    checkCode: record.checkCode,
    checkUrl: record.snapshot.checkUrl,
    pdfSha256: record.pdfSha256,
    endedBy: record.endedById === null ? null : personOf(db, record.endedById),
    replaces: record.replacesId === null ? null : numberOf(db, eq(certificates.id, record.replacesId)),
    replacedBy: numberOf(db, eq(certificates.replacesId, id)),
  }
}

/** A page of the list, and how many there are in all. */
export function selectCertificateList(db: Connection, query: CertificateListQuery): CertificateList {
  const matching = certificatesThat(query)
  const mark = query.before === undefined ? undefined : parsePageMark(query.before)
  const older = mark && sql`(${certificates.issuedAt}, ${certificates.id}) < (${mark.createdAt}, ${mark.id})`
  const rows = selectRows(db, and(matching, older), query.limit + 1)
  const page = cutPage(
    rows.map((row) => ({ ...row, createdAt: row.issuedAt })),
    query.limit,
  )
  const total = db.select({ total: count() }).from(certificates).where(matching).get()?.total ?? 0
  return { rows: page.rows.map(({ createdAt: _createdAt, ...row }) => row), next: page.next, total }
}

/** Every certificate of the list, newest first. */
export function selectCertificatesThat(db: Connection, query: CertificateListQuery): CertificateRow[] {
  return selectRows(db, certificatesThat(query), -1)
}

function certificatesThat(query: CertificateListQuery): SQL | undefined {
  return and(
    query.state === undefined ? undefined : eq(certificates.state, query.state),
    query.pieceId === undefined ? undefined : eq(certificates.pieceId, query.pieceId),
    matchesEach(query.search, (word) =>
      or(contains(certificates.number, word), inArray(certificates.pieceId, piecesWith(word))),
    ),
  )
}

function personOf(db: Connection, id: string): Certificate['endedBy'] {
  return db.select({ id: people.id, name: people.name }).from(people).where(eq(people.id, id)).get() ?? null
}

function numberOf(db: Connection, where: SQL): Certificate['replaces'] {
  const { id, number } = certificates
  return db.select({ id, number }).from(certificates).where(where).get() ?? null
}
