import { may } from '@shared/access/permissions'
import type { Review } from '@shared/schemas/reviews'
import { departuresFromFace } from '@shared/workflow/template-departures'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import type { Connection } from '../../db/client'
import { requireFace } from '../../db/parts'
import { people } from '../../db/schema/people'
import { type ReadingRecord, requireReading } from '../readings/reading-record'
import { selectFaceReadings } from './face-readings'
import { selectRemarks } from './remark-record'
import { agreementRefusal, maySetAside } from './review-refusals'

/** What a reviewer has before them beside the reading itself. */
export function showReview({ db }: AppContext, actor: Actor, readingId: string): Review {
  const record = requireReading(db, readingId)
  const mayReview = may(actor.roles, 'reading:review')
  return {
    remarks: selectRemarks(db, readingId),
    faceReadings: selectFaceReadings(db, record),
    departures: departuresFromFace(requireFace(db, record.faceId), record.marks),
    departureReason: record.departureReason,
    agreed: agreedBy(db, record),
    mayReview,
    refusal: mayReview ? agreementRefusal(db, actor, record) : null,
    maySetAside: maySetAside(db, actor, record),
  }
}

function agreedBy(db: Connection, { agreedById, agreedAt }: ReadingRecord): Review['agreed'] {
  if (agreedById === null || agreedAt === null) return null
  const person = db.select({ name: people.name }).from(people).where(eq(people.id, agreedById)).get()
  return { by: { id: agreedById, name: person?.name ?? '' }, at: agreedAt }
}
