import { may } from '@shared/access/permissions'
import type { Review } from '@shared/schemas/reviews'
import { mayMove } from '@shared/workflow/reading-states'
import type { Actor } from '../../auth/actor'
import type { Connection } from '../../db/client'
import { readSettings } from '../../db/settings'
import { AppError } from '../../errors'
import type { ReadingRecord } from '../readings/reading-record'
import { countOpenRemarks } from './remark-record'

/** Nobody reviews their own reading, save in a one-person shop. */
export function isOwnReview(db: Connection, actor: Actor, record: ReadingRecord): boolean {
  return record.takenById === actor.id && !readSettings(db).onePersonShop
}

/** Why the actor may not agree to a reading; null when they may. */
export function agreementRefusal(db: Connection, actor: Actor, record: ReadingRecord): Review['refusal'] {
  if (isOwnReview(db, actor, record)) return 'ownReading'
  if (!mayMove(record.state, 'agreed')) return 'illegalMove'
  return countOpenRemarks(db, record.id) > 0 ? 'remarksOpen' : null
}

export function assertReviewer(db: Connection, actor: Actor, record: ReadingRecord): void {
  if (isOwnReview(db, actor, record)) throw new AppError('ownReading')
}

/** The taker may set their own draft aside; anything else is the reviewer's. */
export function maySetAside(db: Connection, actor: Actor, record: ReadingRecord): boolean {
  if (!mayMove(record.state, 'setAside')) return false
  const isOpen = record.state === 'draft' || record.state === 'sentBack'
  if (isOpen && record.takenById === actor.id) return may(actor.roles, 'reading:edit-own')
  return may(actor.roles, 'reading:review') && !isOwnReview(db, actor, record)
}
