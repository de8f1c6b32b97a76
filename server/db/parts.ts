import type { Face, Lot, Part } from '@shared/schemas/parts'
import { asc, eq, inArray, type SQL, sql } from 'drizzle-orm'
import { notFound } from '../errors'
import type { Connection } from './client'
import { customers, faces, lots, parts } from './schema/parts'

const partColumns = {
  id: parts.id,
  customerId: parts.customerId,
  number: parts.number,
  revision: parts.revision,
  name: parts.name,
  material: parts.material,
  customerName: customers.name,
}

/** Parts by number and revision. */
export function selectParts(db: Connection, where: SQL | undefined, limit: number): Part[] {
  return db
    .select(partColumns)
    .from(parts)
    .innerJoin(customers, eq(customers.id, parts.customerId))
    .where(where)
    .orderBy(sql`lower(${parts.number})`, sql`lower(${parts.revision})`)
    .limit(limit)
    .all()
}

export function requirePart(db: Connection, id: string): Part {
  const [part] = selectParts(db, eq(parts.id, id), 1)
  if (!part) throw notFound('part')
  return part
}

/** Faces of the parts, in the order of the part's page. */
export function selectFaces(db: Connection, partIds: readonly string[]): Face[] {
  return db
    .select()
    .from(faces)
    .where(inArray(faces.partId, [...partIds]))
    .orderBy(asc(faces.position), asc(faces.id))
    .all()
    .map(toFace)
}

export function requireFace(db: Connection, id: string): Face {
  const row = db.select().from(faces).where(eq(faces.id, id)).get()
  if (!row) throw notFound('face')
  return toFace(row)
}

/** A face as it is sent, without what only the database needs. */
export function toFace(row: typeof faces.$inferSelect): Face {
  const { position: _position, createdAt: _createdAt, ...face } = row
  return face
}

const lotColumns = { id: lots.id, partId: lots.partId, number: lots.number, order: lots.order }

/** Lots of a part, newest first. */
export function selectLots(db: Connection, partId: string): Lot[] {
  return db
    .select(lotColumns)
    .from(lots)
    .where(eq(lots.partId, partId))
    .orderBy(sql`${lots.createdAt} DESC`, sql`${lots.id} DESC`)
    .all()
}

export function requireLot(db: Connection, id: string): Lot {
  const lot = db.select(lotColumns).from(lots).where(eq(lots.id, id)).get()
  if (!lot) throw notFound('lot')
  return lot
}
