import { engineSetUp, type SetUp } from '@shared/metrology'
import type { Conditions, ReadingSetUp } from '@shared/schemas/readings'
import { eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { equipment } from '../../db/schema/equipment'
import { invalidField } from '../../errors'

/** What is known of the set-up, out of the equipment as it is entered now. */
export function requireEngineSetUp(db: Connection, setUp: ReadingSetUp, conditions: Conditions): SetUp {
  const known = engineSetUp({ setUp, conditions }, (id) => {
    const found = db.select({ details: equipment.details }).from(equipment).where(eq(equipment.id, id)).get()
    return found?.details ?? null
  })
  if (!known) throw invalidField('setUp.lightSourceId', { key: 'reading.lightSource.missing' })
  return known
}
