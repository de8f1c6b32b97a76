import type { PieceListQuery } from '@shared/schemas/pieces'
import { isEditable } from '@shared/workflow/reading-states'
import type { AppContext } from '../../context'
import { heightCell, writeCsv } from '../../csv/write-csv'
import { selectPieces, withLatest } from '../../db/pieces'
import { words } from '../../i18n'
import { piecesThat } from './list-pieces'

const heads = [
  'part',
  'partName',
  'serial',
  'lot',
  'customer',
  'reading',
  'state',
  'flatness',
  'u',
  'verdict',
] as const

/** Every piece that a list would show, page after page, with its latest reading, as CSV. */
export function exportPieces({ db }: AppContext, query: PieceListQuery): string {
  const pieces = withLatest(db, selectPieces(db, piecesThat(query), -1))
  const rows = pieces.map(({ latest, ...piece }) => [
    piece.partNumber,
    piece.partName,
    piece.serial,
    piece.lotNumber,
    piece.customerName,
    latest?.number ?? null,
    latest ? words('csv', `state.${latest.state}`) : null,
    heightCell(latest?.result?.flatnessUm),
    heightCell(latest?.result?.expandedUncertaintyUm),
    latest?.result && !isEditable(latest.state) ? words('csv', `verdict.${latest.result.verdict}`) : null,
  ])
  return writeCsv(
    heads.map((head) => words('csv', `head.${head}`)),
    rows,
  )
}
