import type { ReadingRow } from '@shared/schemas/readings'
import { isEditable } from '@shared/workflow/reading-states'
import { count, desc, eq, type SQL, sql } from 'drizzle-orm'
import type { Connection } from './client'
import type { PageMark } from './paging'
import { toFace } from './parts'
import { customers, faces, parts, pieces } from './schema/parts'
import { people } from './schema/people'
import { readings } from './schema/readings'
import { results } from './schema/results'

// The photograph that stands for a reading: its first of bands.
const photoSha256 = sql<string | null>`(
  SELECT sha256 FROM reading_photos
  WHERE reading_id = ${readings.id} AND role = 'bands' ORDER BY added_at LIMIT 1
)`

const rowColumns = {
  id: readings.id,
  number: readings.number,
  state: readings.state,
  pieceId: readings.pieceId,
  partNumber: parts.number,
  partName: parts.name,
  serial: pieces.serial,
  customerName: customers.name,
  takenById: people.id,
  takenByName: people.name,
  createdAt: readings.createdAt,
  updatedAt: readings.updatedAt,
  face: faces,
  photoSha256,
  marksVersion: readings.marksVersion,
  sentBackReason: readings.sentBackReason,
}

const summaryColumns = {
  id: results.id,
  outcome: results.outcome,
  engineVersion: results.engineVersion,
  mode: results.mode,
  flatnessUm: results.flatnessUm,
  minimumZoneUm: results.minimumZoneUm,
  leastSquaresUm: results.leastSquaresUm,
  expandedUncertaintyUm: results.expandedUncertaintyUm,
  sagittaUm: results.sagittaUm,
  bandUm: results.bandUm,
  form: results.form,
  verdict: results.verdict,
  marksVersion: results.marksVersion,
  computedAt: results.computedAt,
}

export interface ReadingRowQuery {
  where?: SQL
  /** Newest first when not given. */
  orderBy?: SQL[]
  limit?: number
}

/**
 * Readings as every list shows them, with their piece, face, taker and latest result. One that has left
 * draft keeps the tolerance it was judged by, whatever is changed on the part afterwards.
 */
export function selectReadingRows(db: Connection, query: ReadingRowQuery = {}): ReadingRow[] {
  const rows = db
    .select({ ...rowColumns, result: summaryColumns, judgedFace: results.face })
    .from(readings)
    .innerJoin(pieces, eq(pieces.id, readings.pieceId))
    .innerJoin(parts, eq(parts.id, pieces.partId))
    .innerJoin(customers, eq(customers.id, parts.customerId))
    .innerJoin(faces, eq(faces.id, readings.faceId))
    .innerJoin(people, eq(people.id, readings.takenById))
    .leftJoin(results, eq(results.id, readings.latestResultId))
    .where(query.where)
    .orderBy(...(query.orderBy ?? newestFirst))
    .limit(query.limit ?? -1)
    .all()
  return rows.map(({ takenById, takenByName, face, judgedFace, ...row }) => ({
    ...row,
    faceName: face.name,
    face: (isEditable(row.state) ? null : judgedFace) ?? toFace(face),
    takenBy: { id: takenById, name: takenByName },
  }))
}

export const newestFirst = [desc(readings.createdAt), desc(readings.id)]
export const oldestFirst = [sql`${readings.createdAt}`, sql`${readings.id}`]

/** Latest reading of each piece that isn't set aside, by piece. */
export function selectLatestByPiece(db: Connection, pieceIds: readonly string[]): Map<string, ReadingRow> {
  const latestIds = sql`(
    SELECT (
      SELECT latest.id FROM readings AS latest
      WHERE latest.piece_id = piece.value AND latest.state <> 'setAside'
      ORDER BY latest.created_at DESC, latest.id DESC LIMIT 1
    ) FROM json_each(${JSON.stringify(pieceIds)}) AS piece
  )`
  const rows = selectReadingRows(db, { where: sql`${readings.id} IN ${latestIds}` })
  return new Map(rows.map((row) => [row.pieceId, row]))
}

/** How many readings match, without opening what they are joined with. */
export function countReadings(db: Connection, where: SQL | undefined): number {
  return db.select({ total: count() }).from(readings).where(where).get()?.total ?? 0
}

/** Rows that come after the one that `before` names, in the order oldest first. */
export function newerThan(before: PageMark): SQL {
  return sql`(${readings.createdAt}, ${readings.id}) > (${before.createdAt}, ${before.id})`
}

/** Rows that come after the one that `before` names, in the order newest first. */
export function olderThan(before: PageMark): SQL {
  return sql`(${readings.createdAt}, ${readings.id}) < (${before.createdAt}, ${before.id})`
}
