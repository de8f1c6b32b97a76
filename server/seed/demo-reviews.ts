import type { ReadingState } from '@shared/workflow/reading-states'
import { mayMove } from '@shared/workflow/reading-states'
import { eq } from 'drizzle-orm'
import type { Actor } from '../auth/actor'
import type { AppContext } from '../context'
import { inTransaction, type Tx } from '../db/client'
import type { EventKind } from '../db/event-kinds'
import { recordEvent } from '../db/events'
import { newId } from '../db/ids'
import { readings } from '../db/schema/readings'
import { reviewRemarks } from '../db/schema/reviews'
import { requireReading } from '../use-cases/readings/reading-record'
import { requireResult } from '../use-cases/results/select-result'

export interface DemoRemark {
  text: string
  place: { x: number; y: number }
}

/** What the second person made of a reading that was sent. */
export type DemoReview =
  | { kind: 'agreed' }
  | { kind: 'sentBack'; reason: string; remark: DemoRemark }
  | { kind: 'setAside'; cause: string }

interface Move {
  to: ReadingState
  event: EventKind
  columns: Partial<typeof readings.$inferInsert>
  data: Record<string, unknown>
}

/** State, remark and event of a review in one transaction. */
export function reviewDemoReading(context: AppContext, actor: Actor, id: string, review: DemoReview): void {
  inTransaction(context.db, (tx) => {
    const at = context.now()
    const { to, event, columns, data } = moveOf(tx, id, review)
    const { state } = requireReading(tx, id)
    if (!mayMove(state, to)) throw new Error(`A demo reading can't go from ${state} to ${to}.`)
    tx.update(readings)
      .set({ ...columns, state: to, updatedAt: at.toISOString() })
      .where(eq(readings.id, id))
      .run()
    if (review.kind === 'sentBack') addRemark(tx, actor, id, review.remark, at)
    recordEvent(tx, { kind: event, subject: { type: 'reading', id }, actor, data, at })
  })
}

function moveOf(tx: Tx, id: string, review: DemoReview): Move {
  switch (review.kind) {
    case 'agreed':
      return { to: 'agreed', event: 'reading.agreed', columns: {}, data: figureOf(tx, id) }
    case 'sentBack': {
      const { reason } = review
      return {
        to: 'sentBack',
        event: 'reading.sentBack',
        columns: { sentBackReason: reason },
        data: { reason },
      }
    }
    case 'setAside': {
      const { cause } = review
      return { to: 'setAside', event: 'reading.setAside', columns: { setAsideCause: cause }, data: { cause } }
    }
    default:
      throw new Error(`No review ends so: ${review satisfies never}.`)
  }
}

function figureOf(tx: Tx, id: string): Record<string, unknown> {
  const { latestResultId } = requireReading(tx, id)
  if (latestResultId === null) throw new Error('A demo reading was agreed without a figure.')
  const { flatnessUm, expandedUncertaintyUm, verdict } = requireResult(tx, latestResultId)
  return { resultId: latestResultId, flatnessUm, expandedUncertaintyUm, verdict }
}

function addRemark(tx: Tx, actor: Actor, readingId: string, { text, place }: DemoRemark, at: Date): void {
  tx.insert(reviewRemarks)
    .values({ id: newId(), readingId, authorId: actor.id, text, place, createdAt: at.toISOString() })
    .run()
}
