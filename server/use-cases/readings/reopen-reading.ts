import type { Reading } from '@shared/schemas/readings'
import { mayMove } from '@shared/workflow/reading-states'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { readings } from '../../db/schema/readings'
import { AppError } from '../../errors'
import { requireOwnReading } from './reading-record'
import { readReading } from './show-reading'

/** Sent back to draft, to be worked on again; why it was sent back stays in sight until it is sent. */
export function reopenReading({ db, now }: AppContext, actor: Actor, id: string): Reading {
  return inTransaction(db, (tx) => {
    const { state } = requireOwnReading(tx, actor, id)
    if (!mayMove(state, 'draft')) throw new AppError('illegalMove', { details: { state } })
    const at = now()
    tx.update(readings).set({ state: 'draft', updatedAt: at.toISOString() }).where(eq(readings.id, id)).run()
    recordEvent(tx, { kind: 'reading.reopened', subject: { type: 'reading', id }, actor, at })
    return readReading(tx, actor, id)
  })
}
