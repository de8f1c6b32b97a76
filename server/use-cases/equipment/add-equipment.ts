import type { Equipment, NewEquipment } from '@shared/schemas/equipment'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { requireEquipment } from '../../db/equipment'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { equipment } from '../../db/schema/equipment'
import { withUniqueClash } from '../../db/unique'
import { equipmentTaken } from './equipment-taken'

export function addEquipment({ db, now }: AppContext, actor: Actor, input: NewEquipment): Equipment {
  const id = newId()
  return inTransaction(db, (tx) => {
    const at = now()
    const row = {
      ...input,
      id,
      kind: input.details.kind,
      dueOn: input.calibration?.dueOn ?? null,
      createdAt: at.toISOString(),
    }
    withUniqueClash(
      () => tx.insert(equipment).values(row).run(),
      () => equipmentTaken(input.name),
    )
    recordEvent(tx, {
      kind: 'equipment.added',
      subject: { type: 'equipment', id },
      actor,
      data: { ...input },
      at,
    })
    return requireEquipment(tx, id)
  })
}
