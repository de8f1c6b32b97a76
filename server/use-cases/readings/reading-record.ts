import { isEditable } from '@shared/workflow/reading-states'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { Connection } from '../../db/client'
import { readings } from '../../db/schema/readings'
import { AppError, notFound } from '../../errors'

export type ReadingRecord = typeof readings.$inferSelect

/** The reading as it stands in the database. */
export function requireReading(db: Connection, id: string): ReadingRecord {
  const record = db.select().from(readings).where(eq(readings.id, id)).get()
  if (!record) throw notFound('reading')
  return record
}

/** The reading, if it is the actor's own: nobody changes another's. */
export function requireOwnReading(db: Connection, actor: Actor, id: string): ReadingRecord {
  const record = requireReading(db, id)
  if (record.takenById !== actor.id) throw new AppError('notYours')
  return record
}

/** The actor's own reading, if it may still be changed. */
export function requireEditableReading(db: Connection, actor: Actor, id: string): ReadingRecord {
  const record = requireOwnReading(db, actor, id)
  if (!isEditable(record.state)) throw new AppError('notEditable', { details: { state: record.state } })
  return record
}
