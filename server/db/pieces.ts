import type { Piece } from '@shared/schemas/parts'
import type { PieceRow } from '@shared/schemas/pieces'
import { count, desc, eq, type SQL, sql } from 'drizzle-orm'
import { notFound } from '../errors'
import type { Connection } from './client'
import type { PageMark } from './paging'
import { selectLatestByPiece } from './reading-rows'
import { customers, lots, parts, pieces } from './schema/parts'

const pieceColumns = {
  id: pieces.id,
  partId: pieces.partId,
  lotId: pieces.lotId,
  serial: pieces.serial,
  partNumber: parts.number,
  partRevision: parts.revision,
  partName: parts.name,
  customerName: customers.name,
  lotNumber: lots.number,
  createdAt: pieces.createdAt,
}

/** Columns that a search for a piece looks into. */
export const pieceSearchColumns = [pieces.serial, parts.number, parts.name, customers.name, lots.number]

/** Pieces, newest first. */
export function selectPieces(db: Connection, where: SQL | undefined, limit: number): Piece[] {
  return db
    .select(pieceColumns)
    .from(pieces)
    .innerJoin(parts, eq(parts.id, pieces.partId))
    .innerJoin(customers, eq(customers.id, parts.customerId))
    .leftJoin(lots, eq(lots.id, pieces.lotId))
    .where(where)
    .orderBy(desc(pieces.createdAt), desc(pieces.id))
    .limit(limit)
    .all()
}

/** How many pieces match. */
export function countPieces(db: Connection, where: SQL | undefined): number {
  const counted = db
    .select({ total: count() })
    .from(pieces)
    .innerJoin(parts, eq(parts.id, pieces.partId))
    .innerJoin(customers, eq(customers.id, parts.customerId))
    .leftJoin(lots, eq(lots.id, pieces.lotId))
    .where(where)
    .get()
  return counted?.total ?? 0
}

export function requirePiece(db: Connection, id: string): Piece {
  const [piece] = selectPieces(db, eq(pieces.id, id), 1)
  if (!piece) throw notFound('piece')
  return piece
}

export function piecesOlderThan(mark: PageMark): SQL {
  return sql`(${pieces.createdAt}, ${pieces.id}) < (${mark.createdAt}, ${mark.id})`
}

export function withLatest(db: Connection, found: readonly Piece[]): PieceRow[] {
  const ids = found.map((piece) => piece.id)
  const latest = selectLatestByPiece(db, ids)
  return found.map((piece) => ({ ...piece, latest: latest.get(piece.id) ?? null }))
}
