import type { SavedMarks, SaveMarks } from '@shared/schemas/readings'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction, type Tx } from '../../db/client'
import { people } from '../../db/schema/people'
import { readings } from '../../db/schema/readings'
import { AppError } from '../../errors'
import { type ReadingRecord, requireEditableReading } from './reading-record'

/**
 * Keeps the marks as they are now, if they were edited from those that are kept. No event: marks are saved at every
 * click, and each figure that is computed keeps those that it came from.
 */
export function saveMarks({ db, now }: AppContext, actor: Actor, id: string, input: SaveMarks): SavedMarks {
  return inTransaction(db, (tx) => {
    const before = requireEditableReading(tx, actor, id)
    if (input.basedOnVersion !== before.marksVersion) throw staleMarks(tx, before)
    const savedAt = now().toISOString()
    const marksVersion = before.marksVersion + 1
    tx.update(readings)
      .set({
        marks: input.marks,
        marksVersion,
        marksSavedAt: savedAt,
        marksSavedById: actor.id,
        updatedAt: savedAt,
      })
      .where(eq(readings.id, id))
      .run()
    return { marksVersion, savedAt }
  })
}

function staleMarks(tx: Tx, { marksVersion, marksSavedAt, marksSavedById }: ReadingRecord): AppError {
  const savedBy =
    marksSavedById === null
      ? undefined
      : tx.select({ name: people.name }).from(people).where(eq(people.id, marksSavedById)).get()
  return new AppError('staleMarks', {
    details: { currentVersion: marksVersion, savedAt: marksSavedAt, savedBy: savedBy?.name ?? null },
  })
}
