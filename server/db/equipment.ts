import type { Equipment } from '@shared/schemas/equipment'
import { eq, type SQL, sql } from 'drizzle-orm'
import { notFound } from '../errors'
import type { Connection } from './client'
import { equipment } from './schema/equipment'

/** Equipment by kind and name. */
export function selectEquipment(db: Connection, where?: SQL, orderBy: SQL[] = byKind): Equipment[] {
  return db
    .select()
    .from(equipment)
    .where(where)
    .orderBy(...orderBy)
    .all()
    .map(toEquipment)
}

const byKind = [sql`${equipment.kind}`, sql`lower(${equipment.name})`]

export function requireEquipment(db: Connection, id: string): Equipment {
  const [found] = selectEquipment(db, eq(equipment.id, id))
  if (!found) throw notFound('equipment')
  return found
}

function toEquipment(row: typeof equipment.$inferSelect): Equipment {
  const { kind: _kind, dueOn: _dueOn, createdAt: _createdAt, ...rest } = row
  return rest
}
