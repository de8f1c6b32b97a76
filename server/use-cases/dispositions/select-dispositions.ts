import type { Disposition } from '@shared/schemas/reviews'
import { desc, eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { people } from '../../db/schema/people'
import { readings } from '../../db/schema/readings'
import { dispositions } from '../../db/schema/reviews'

/** Of a piece, newest first: the first one counts. */
export function selectDispositions(db: Connection, pieceId: string): Disposition[] {
  return db
    .select({ row: dispositions, name: people.name, readingNumber: readings.number })
    .from(dispositions)
    .innerJoin(people, eq(people.id, dispositions.decidedById))
    .innerJoin(readings, eq(readings.id, dispositions.readingId))
    .where(eq(dispositions.pieceId, pieceId))
    .orderBy(desc(dispositions.decidedAt), desc(dispositions.id))
    .all()
    .map(({ row: { decidedById, ...row }, name, readingNumber }) => ({
      ...row,
      readingNumber,
      decidedBy: { id: decidedById, name },
    }))
}
