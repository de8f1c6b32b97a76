import type { Reading } from '@shared/schemas/readings'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { requireReading } from '../readings/reading-record'
import { readReading } from '../readings/show-reading'
import { moveReading } from './move-reading'
import { assertReviewer } from './review-refusals'

/** Back to whoever took it, with the reason. */
export function sendBackReading({ db, now }: AppContext, actor: Actor, id: string, reason: string): Reading {
  return inTransaction(db, (tx) => {
    const record = requireReading(tx, id)
    assertReviewer(tx, actor, record)
    const columns = { sentBackReason: reason }
    const move = { to: 'sentBack', event: 'reading.sentBack', data: { reason }, columns, at: now() } as const
    moveReading(tx, actor, record, move)
    return readReading(tx, actor, id)
  })
}
