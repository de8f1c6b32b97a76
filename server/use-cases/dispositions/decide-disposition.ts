import type { Disposition, NewDisposition } from '@shared/schemas/reviews'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { requirePiece } from '../../db/pieces'
import { dispositions } from '../../db/schema/reviews'
import { AppError, invalidField } from '../../errors'
import { requireReading } from '../readings/reading-record'
import { requireResult } from '../results/select-result'
import { selectDispositions } from './select-dispositions'

/** What is done with a piece whose agreed reading doesn't conform, or of which neither is proven. */
export function decideDisposition(
  { db, now }: AppContext,
  actor: Actor,
  pieceId: string,
  input: NewDisposition,
): Disposition[] {
  return inTransaction(db, (tx) => {
    requirePiece(tx, pieceId)
    const reading = requireReading(tx, input.readingId)
    if (reading.pieceId !== pieceId) throw invalidField('readingId', { key: 'disposition.otherPiece' })
    const isSettled = reading.state === 'agreed' || reading.state === 'certified'
    const verdict = reading.latestResultId && requireResult(tx, reading.latestResultId).verdict
    if (!isSettled || (verdict !== 'doesNotConform' && verdict !== 'neitherProven')) {
      throw new AppError('nothingToDispose', { details: { state: reading.state, verdict } })
    }
    const at = now()
    tx.insert(dispositions)
      .values({ ...input, id: newId(), pieceId, decidedById: actor.id, decidedAt: at.toISOString() })
      .run()
    recordEvent(tx, {
      kind: 'piece.disposed',
      subject: { type: 'piece', id: pieceId },
      actor,
      data: { ...input },
      at,
    })
    return selectDispositions(tx, pieceId)
  })
}
