import type { PartPage } from '@shared/schemas/pieces'
import { eq } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { requirePart, selectFaces, selectLots } from '../../db/parts'
import { selectPieces, withLatest } from '../../db/pieces'
import { pieces } from '../../db/schema/parts'

const mostPieces = 200

/** A part with its faces, lots, and its newest pieces. */
export function showPart({ db }: AppContext, id: string): PartPage {
  const part = requirePart(db, id)
  return {
    part,
    faces: selectFaces(db, [id]),
    lots: selectLots(db, id),
    pieces: withLatest(db, selectPieces(db, eq(pieces.partId, id), mostPieces)),
  }
}
