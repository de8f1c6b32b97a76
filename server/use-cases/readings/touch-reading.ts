import { eq } from 'drizzle-orm'
import type { Tx } from '../../db/client'
import { readings } from '../../db/schema/readings'

/** Notes that something of the reading was changed now. */
export function touchReading(tx: Tx, id: string, at: Date): void {
  tx.update(readings).set({ updatedAt: at.toISOString() }).where(eq(readings.id, id)).run()
}
