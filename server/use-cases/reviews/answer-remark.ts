import { may } from '@shared/access/permissions'
import type { Remark } from '@shared/schemas/reviews'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { remarkAnswers } from '../../db/schema/reviews'
import { AppError } from '../../errors'
import { requireReading } from '../readings/reading-record'
import { requireRemark, selectRemarks } from './remark-record'

/** By whoever took the reading, or by a reviewer, while the remark is open. */
export function answerRemark({ db, now }: AppContext, actor: Actor, id: string, text: string): Remark[] {
  return inTransaction(db, (tx) => {
    const remark = requireRemark(tx, id)
    const record = requireReading(tx, remark.readingId)
    if (record.takenById !== actor.id && !may(actor.roles, 'reading:review')) throw new AppError('notYours')
    if (remark.closedAt !== null) throw new AppError('remarkClosed')
    const at = now()
    tx.insert(remarkAnswers)
      .values({ id: newId(), remarkId: id, authorId: actor.id, text, createdAt: at.toISOString() })
      .run()
    const subject = { type: 'reading', id: remark.readingId } as const
    recordEvent(tx, { kind: 'remark.answered', subject, actor, data: { remarkId: id, text }, at })
    return selectRemarks(tx, remark.readingId)
  })
}
