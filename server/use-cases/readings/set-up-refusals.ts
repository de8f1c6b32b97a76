import type { EquipmentKind } from '@shared/schemas/equipment'
import type { ReadingSetUp } from '@shared/schemas/readings'
import { and, eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { equipment } from '../../db/schema/equipment'
import { invalidField } from '../../errors'

const kindOf = {
  lightSourceId: 'lightSource',
  referenceFlatId: 'referenceFlat',
  cameraSetUpId: 'cameraSetUp',
  thermometerId: 'thermometer',
} as const satisfies Partial<Record<keyof ReadingSetUp, EquipmentKind>>

/** Refuses a set-up that names equipment of another kind, or none of the shop's. */
export function assertSetUp(db: Connection, setUp: ReadingSetUp): void {
  for (const [field, kind] of Object.entries(kindOf) as [keyof typeof kindOf, EquipmentKind][]) {
    const id = setUp[field]
    if (id !== null && !isOfKind(db, id, kind)) {
      throw invalidField(`setUp.${field}`, { key: 'reading.equipment.otherKind' })
    }
  }
}

function isOfKind(db: Connection, id: string, kind: EquipmentKind): boolean {
  const found = db
    .select({ id: equipment.id })
    .from(equipment)
    .where(and(eq(equipment.id, id), eq(equipment.kind, kind)))
    .get()
  return found !== undefined
}
