import type { PieceList, PieceListQuery } from '@shared/schemas/pieces'
import { and, eq } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { cutPage, parsePageMark } from '../../db/paging'
import { pieceSearchColumns, piecesOlderThan, selectPieces, withLatest } from '../../db/pieces'
import { pieces } from '../../db/schema/parts'
import { matchesWords } from '../../db/search-text'

/** Pieces newest first, each with its latest reading. */
export function listPieces({ db }: AppContext, query: PieceListQuery): PieceList {
  const where = and(
    query.partId === undefined ? undefined : eq(pieces.partId, query.partId),
    query.before === undefined ? undefined : piecesOlderThan(parsePageMark(query.before)),
    matchesWords(query.search, pieceSearchColumns),
  )
  const { rows, next } = cutPage(selectPieces(db, where, query.limit + 1), query.limit)
  return { rows: withLatest(db, rows), next }
}
