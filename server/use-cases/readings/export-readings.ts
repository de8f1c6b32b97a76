import type { ReadingListQuery, ReadingRow } from '@shared/schemas/readings'
import { isEditable } from '@shared/workflow/reading-states'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { type CsvCell, heightCell, writeCsv } from '../../csv/write-csv'
import { newestFirst, oldestFirst, selectReadingRows } from '../../db/reading-rows'
import { words } from '../../i18n'
import { readingsThat } from './list-readings'

const heads = [
  'part',
  'partName',
  'serial',
  'face',
  'customer',
  'reading',
  'state',
  'flatness',
  'u',
  'verdict',
  'takenBy',
  'started',
] as const

/** Every reading that a list would show, page after page, as CSV. A draft has no verdict. */
export function exportReadings({ db }: AppContext, actor: Actor, query: ReadingListQuery): string {
  const rows = selectReadingRows(db, {
    where: readingsThat(actor, query),
    orderBy: query.order === 'oldest' ? oldestFirst : newestFirst,
  })
  return writeCsv(
    heads.map((head) => words('csv', `head.${head}`)),
    rows.map(cellsOf),
  )
}

function cellsOf(row: ReadingRow): CsvCell[] {
  const { result, state } = row
  return [
    row.partNumber,
    row.partName,
    row.serial,
    row.faceName,
    row.customerName,
    row.number,
    words('csv', `state.${state}`),
    heightCell(result?.flatnessUm),
    heightCell(result?.expandedUncertaintyUm),
    result && !isEditable(state) ? words('csv', `verdict.${result.verdict}`) : null,
    row.takenBy.name,
    row.createdAt,
  ]
}
