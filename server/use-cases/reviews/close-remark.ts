import type { Remark } from '@shared/schemas/reviews'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { reviewRemarks } from '../../db/schema/reviews'
import { AppError } from '../../errors'
import { requireReading } from '../readings/reading-record'
import { requireRemark, selectRemarks } from './remark-record'
import { assertReviewer } from './review-refusals'

/** A reviewer is content with what was done about it. */
export function closeRemark({ db, now }: AppContext, actor: Actor, id: string): Remark[] {
  return inTransaction(db, (tx) => {
    const remark = requireRemark(tx, id)
    assertReviewer(tx, actor, requireReading(tx, remark.readingId))
    if (remark.closedAt !== null) throw new AppError('remarkClosed')
    const at = now()
    tx.update(reviewRemarks)
      .set({ closedById: actor.id, closedAt: at.toISOString() })
      .where(eq(reviewRemarks.id, id))
      .run()
    const subject = { type: 'reading', id: remark.readingId } as const
    recordEvent(tx, { kind: 'remark.closed', subject, actor, data: { remarkId: id }, at })
    return selectRemarks(tx, remark.readingId)
  })
}
