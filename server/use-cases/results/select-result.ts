import type { ReadingResult } from '@shared/schemas/results'
import { eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { results } from '../../db/schema/results'
import { notFound } from '../../errors'

export type ResultRecord = typeof results.$inferSelect

export function requireResult(db: Connection, id: string): ResultRecord {
  const record = db.select().from(results).where(eq(results.id, id)).get()
  if (!record) throw notFound('reading')
  return record
}

/** A result whole, as it is sent. */
export function selectResult(db: Connection, id: string): ReadingResult {
  const {
    readingId: _readingId,
    computedById: _computedById,
    supportedShare: _supportedShare,
    face: _face,
    inputs: _inputs,
    ...result
  } = requireResult(db, id)
  return result
}
