import type { PieceList, PieceListQuery } from '@shared/schemas/pieces'
import { and, eq, type SQL } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { cutPage, parsePageMark } from '../../db/paging'
import { countPieces, pieceSearchColumns, piecesOlderThan, selectPieces, withLatest } from '../../db/pieces'
import { pieces } from '../../db/schema/parts'
import { matchesWords } from '../../db/search-text'

/** Pieces newest first, each with its latest reading, and how many there are. */
export function listPieces({ db }: AppContext, query: PieceListQuery): PieceList {
  const matching = piecesThat(query)
  const older = query.before === undefined ? undefined : piecesOlderThan(parsePageMark(query.before))
  const { rows, next } = cutPage(selectPieces(db, and(matching, older), query.limit + 1), query.limit)
  return { rows: withLatest(db, rows), next, total: countPieces(db, matching) }
}

/** Every condition of a query but the page. */
export function piecesThat({ partId, search }: PieceListQuery): SQL | undefined {
  return and(
    partId === undefined ? undefined : eq(pieces.partId, partId),
    matchesWords(search, pieceSearchColumns),
  )
}
