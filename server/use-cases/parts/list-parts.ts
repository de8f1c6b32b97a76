import type { PartRow } from '@shared/schemas/parts'
import { count, inArray } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { selectFaces, selectParts } from '../../db/parts'
import { customers, parts, pieces } from '../../db/schema/parts'
import { matchesWords } from '../../db/search-text'

const mostParts = 500

/** Parts that hold every word of the search, with their faces and how many pieces there are. */
export function listParts({ db }: AppContext, search: string | undefined): PartRow[] {
  const columns = [parts.number, parts.revision, parts.name, parts.material, customers.name]
  const found = selectParts(db, matchesWords(search, columns), mostParts)
  const partIds = found.map((part) => part.id)
  const faces = selectFaces(db, partIds)
  const counts = db
    .select({ partId: pieces.partId, pieces: count() })
    .from(pieces)
    .where(inArray(pieces.partId, partIds))
    .groupBy(pieces.partId)
    .all()
  const countOf = new Map(counts.map((row) => [row.partId, row.pieces]))
  return found.map((part) => ({
    ...part,
    faces: faces.filter((face) => face.partId === part.id),
    pieceCount: countOf.get(part.id) ?? 0,
  }))
}
