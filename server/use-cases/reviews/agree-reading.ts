import type { Reading } from '@shared/schemas/readings'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { AppError } from '../../errors'
import { requireReading } from '../readings/reading-record'
import { readReading } from '../readings/show-reading'
import { requireResult } from '../results/select-result'
import { moveReading } from './move-reading'
import { agreementRefusal } from './review-refusals'

/** The reading stands as it was sent; every remark on it must have been closed. */
export function agreeReading({ db, now }: AppContext, actor: Actor, id: string): Reading {
  return inTransaction(db, (tx) => {
    const record = requireReading(tx, id)
    const refusal = agreementRefusal(tx, actor, record)
    if (refusal) throw new AppError(refusal, { details: { state: record.state } })
    if (record.latestResultId === null) throw new AppError('figureMissing')
    const { flatnessUm, expandedUncertaintyUm, verdict } = requireResult(tx, record.latestResultId)
    const at = now()
    moveReading(tx, actor, record, {
      to: 'agreed',
      event: 'reading.agreed',
      data: { resultId: record.latestResultId, flatnessUm, expandedUncertaintyUm, verdict },
      columns: { agreedById: actor.id, agreedAt: at.toISOString() },
      at,
    })
    return readReading(tx, actor, id)
  })
}
