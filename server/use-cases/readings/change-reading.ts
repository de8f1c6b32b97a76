import type { Reading, readingChangeSchema } from '@shared/schemas/readings'
import { eq } from 'drizzle-orm'
import type { z } from 'zod'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { differences } from '../../db/differences'
import { recordEvent } from '../../db/events'
import { readings } from '../../db/schema/readings'
import { requireEditableReading } from './reading-record'
import { assertSetUp } from './set-up-refusals'
import { readReading } from './show-reading'

/** Set-up and conditions; a figure computed from other ones can't be sent any more. */
export function changeReading(
  { db, now }: AppContext,
  actor: Actor,
  id: string,
  change: z.infer<typeof readingChangeSchema>,
): Reading {
  return inTransaction(db, (tx) => {
    const before = requireEditableReading(tx, actor, id)
    if (change.setUp) assertSetUp(tx, change.setUp)
    const changes = {
      ...(change.setUp && differences(before.setUp, change.setUp)),
      ...(change.conditions && differences(before.conditions, change.conditions)),
    }
    if (Object.keys(changes).length > 0) {
      const at = now()
      tx.update(readings)
        .set({ ...change, updatedAt: at.toISOString() })
        .where(eq(readings.id, id))
        .run()
      recordEvent(tx, {
        kind: 'reading.changed',
        subject: { type: 'reading', id },
        actor,
        data: { changes },
        at,
      })
    }
    return readReading(tx, actor, id)
  })
}
