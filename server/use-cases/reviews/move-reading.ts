import type { ReadingState } from '@shared/workflow/reading-states'
import { mayMove } from '@shared/workflow/reading-states'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { Tx } from '../../db/client'
import type { EventKind } from '../../db/event-kinds'
import { recordEvent } from '../../db/events'
import { readings } from '../../db/schema/readings'
import { AppError } from '../../errors'
import type { ReadingRecord } from '../readings/reading-record'

interface Move {
  to: ReadingState
  event: EventKind
  data: Record<string, unknown>
  columns?: Partial<typeof readings.$inferInsert>
  at: Date
}

/** State and event together, from the record as it was read in this transaction. */
export function moveReading(
  tx: Tx,
  actor: Actor,
  record: ReadingRecord,
  { to, event, data, columns, at }: Move,
): void {
  if (!mayMove(record.state, to)) throw new AppError('illegalMove', { details: { state: record.state } })
  tx.update(readings)
    .set({ ...columns, state: to, updatedAt: at.toISOString() })
    .where(eq(readings.id, record.id))
    .run()
  recordEvent(tx, { kind: event, subject: { type: 'reading', id: record.id }, actor, data, at })
}
