import type { Reading } from '@shared/schemas/readings'
import type { Departure, SendReading } from '@shared/schemas/reviews'
import { mayMove } from '@shared/workflow/reading-states'
import { departuresFromFace } from '@shared/workflow/template-departures'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { requireFace } from '../../db/parts'
import { readings } from '../../db/schema/readings'
import { AppError, invalidField } from '../../errors'
import { selectCurrentFigure } from '../results/current-figure'
import { requireOwnReading } from './reading-record'
import { readReading } from './show-reading'

/** Draft to sent for review. The figure that is sent must be the one of the marks and set-up as they stand. */
export function sendReading(
  { db, now }: AppContext,
  actor: Actor,
  id: string,
  { departureReason }: SendReading = { departureReason: '' },
): Reading {
  return inTransaction(db, (tx) => {
    const record = requireOwnReading(tx, actor, id)
    if (!mayMove(record.state, 'sentForReview')) {
      throw new AppError('illegalMove', { details: { state: record.state } })
    }
    const figure = selectCurrentFigure(tx, record)
    if (!figure) throw new AppError('figureMissing')
    const departures = departuresFromFace(requireFace(tx, record.faceId), record.marks)
    if (departures.length > 0 && departureReason === '') throw reasonMissing(departures)
    const at = now()
    tx.update(readings)
      .set({
        state: 'sentForReview',
        sentAt: at.toISOString(),
        updatedAt: at.toISOString(),
        sentBackReason: null,
        departureReason: departures.length > 0 ? departureReason : null,
      })
      .where(eq(readings.id, id))
      .run()
    recordEvent(tx, {
      kind: 'reading.sentForReview',
      subject: { type: 'reading', id },
      actor,
      data: {
        resultId: figure.id,
        flatnessUm: figure.flatnessUm,
        expandedUncertaintyUm: figure.expandedUncertaintyUm,
        verdict: figure.verdict,
        departures,
        departureReason: departures.length > 0 ? departureReason : null,
      },
      at,
    })
    return readReading(tx, actor, id)
  })
}

function reasonMissing(departures: readonly Departure[]): AppError {
  const what = departures.length > 1 ? 'both' : departures[0]
  return invalidField('departureReason', { key: `review.departure.${what}` })
}
