import type { NewRemark, Remark } from '@shared/schemas/reviews'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { reviewRemarks } from '../../db/schema/reviews'
import { AppError } from '../../errors'
import { requireReading } from '../readings/reading-record'
import { selectRemarks } from './remark-record'
import { assertReviewer } from './review-refusals'

/** A remark on a reading that waits for review, pinned to a place in the photograph or on the whole. */
export function addRemark(
  { db, now }: AppContext,
  actor: Actor,
  readingId: string,
  { text, place }: NewRemark,
): Remark[] {
  return inTransaction(db, (tx) => {
    const record = requireReading(tx, readingId)
    assertReviewer(tx, actor, record)
    if (record.state !== 'sentForReview') {
      throw new AppError('illegalMove', { details: { state: record.state } })
    }
    const at = now()
    const id = newId()
    tx.insert(reviewRemarks)
      .values({ id, readingId, authorId: actor.id, text, place, createdAt: at.toISOString() })
      .run()
    const data = { remarkId: id, text, place }
    recordEvent(tx, { kind: 'remark.added', subject: { type: 'reading', id: readingId }, actor, data, at })
    return selectRemarks(tx, readingId)
  })
}
