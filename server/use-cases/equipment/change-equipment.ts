import type { Equipment, NewEquipment } from '@shared/schemas/equipment'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { differences } from '../../db/differences'
import { requireEquipment } from '../../db/equipment'
import { recordEvent } from '../../db/events'
import { equipment } from '../../db/schema/equipment'
import { withUniqueClash } from '../../db/unique'
import { invalidField } from '../../errors'
import { equipmentTaken } from './equipment-taken'

/** Results keep what the equipment was when they were computed, so it may be changed at any time. */
export function changeEquipment(
  { db, now }: AppContext,
  actor: Actor,
  id: string,
  change: Partial<NewEquipment>,
): Equipment {
  return inTransaction(db, (tx) => {
    const before = requireEquipment(tx, id)
    assertSameKind(before, change)
    const changes = differences<NewEquipment>(before, change)
    if (!changes) return before
    const dueOn = (change.calibration === undefined ? before : change).calibration?.dueOn ?? null
    withUniqueClash(
      () =>
        tx
          .update(equipment)
          .set({ ...change, dueOn })
          .where(eq(equipment.id, id))
          .run(),
      () => equipmentTaken(change.name ?? before.name),
    )
    recordEvent(tx, {
      kind: 'equipment.changed',
      subject: { type: 'equipment', id },
      actor,
      data: { changes },
      at: now(),
    })
    return requireEquipment(tx, id)
  })
}

function assertSameKind(before: Equipment, { details }: Partial<NewEquipment>): void {
  if (details && details.kind !== before.details.kind) {
    throw invalidField('details.kind', { key: 'equipment.kind.fixed' })
  }
}
