import type { Reading } from '@shared/schemas/readings'
import { mayMove } from '@shared/workflow/reading-states'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { AppError } from '../../errors'
import { requireReading } from '../readings/reading-record'
import { readReading } from '../readings/show-reading'
import { moveReading } from './move-reading'
import { isOwnReview, maySetAside } from './review-refusals'

/** The reading counts no more, for a cause that stays in sight. */
export function setAsideReading({ db, now }: AppContext, actor: Actor, id: string, cause: string): Reading {
  return inTransaction(db, (tx) => {
    const record = requireReading(tx, id)
    if (!mayMove(record.state, 'setAside')) {
      throw new AppError('illegalMove', { details: { state: record.state } })
    }
    if (!maySetAside(tx, actor, record)) {
      throw new AppError(isOwnReview(tx, actor, record) ? 'ownReading' : 'notYours')
    }
    const columns = { setAsideCause: cause }
    const move = { to: 'setAside', event: 'reading.setAside', data: { cause }, columns, at: now() } as const
    moveReading(tx, actor, record, move)
    return readReading(tx, actor, id)
  })
}
