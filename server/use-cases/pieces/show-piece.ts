import type { PiecePage } from '@shared/schemas/pieces'
import { eq } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { requirePart, selectFaces } from '../../db/parts'
import { requirePiece } from '../../db/pieces'
import { oldestFirst, selectReadingRows } from '../../db/reading-rows'
import { readings } from '../../db/schema/readings'
import { selectCertificatesOfPiece } from '../certificates/select-certificates'
import { selectDispositions } from '../dispositions/select-dispositions'

/** A piece with its part, its faces, and every reading of it. */
export function showPiece({ db }: AppContext, id: string): PiecePage {
  const piece = requirePiece(db, id)
  return {
    piece,
    part: requirePart(db, piece.partId),
    faces: selectFaces(db, [piece.partId]),
    readings: selectReadingRows(db, { where: eq(readings.pieceId, id), orderBy: oldestFirst }),
    dispositions: selectDispositions(db, id),
    certificates: selectCertificatesOfPiece(db, id),
  }
}
