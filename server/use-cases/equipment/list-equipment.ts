import type { Equipment, EquipmentKind } from '@shared/schemas/equipment'
import { eq } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { selectEquipment } from '../../db/equipment'
import { equipment } from '../../db/schema/equipment'

export function listEquipment({ db }: AppContext, kind: EquipmentKind | undefined): Equipment[] {
  return selectEquipment(db, kind === undefined ? undefined : eq(equipment.kind, kind))
}
