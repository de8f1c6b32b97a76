import type { Review } from '@shared/schemas/reviews'
import { and, eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { oldestFirst, selectReadingRows } from '../../db/reading-rows'
import { readings } from '../../db/schema/readings'
import type { ReadingRecord } from '../readings/reading-record'

/**
 * Every reading of the same face of the same piece, oldest first. Those since the piece was last lapped count, save
 * the ones set aside for a cause and those that another was taken to correct.
 */
export function selectFaceReadings(
  db: Connection,
  { pieceId, faceId }: Pick<ReadingRecord, 'pieceId' | 'faceId'>,
): Review['faceReadings'] {
  const ofFace = and(eq(readings.pieceId, pieceId), eq(readings.faceId, faceId))
  const facts = new Map(
    db
      .select({
        id: readings.id,
        lappedSince: readings.lappedSince,
        setAsideCause: readings.setAsideCause,
        correctsId: readings.correctsId,
      })
      .from(readings)
      .where(ofFace)
      .all()
      .map((row) => [row.id, row]),
  )
  const rows = selectReadingRows(db, { where: ofFace, orderBy: oldestFirst })
  const firstThatCounts = rows.findLastIndex(({ id }) => facts.get(id)?.lappedSince)
  const corrected = new Set([...facts.values()].map(({ correctsId }) => correctsId))
  return rows.map((row, i) => ({
    ...row,
    counts: i >= firstThatCounts && row.state !== 'setAside' && !corrected.has(row.id),
    setAsideCause: facts.get(row.id)?.setAsideCause ?? null,
  }))
}
