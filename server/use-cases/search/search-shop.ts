import type { Found } from '@shared/schemas/search'
import { sql } from 'drizzle-orm'
import type { AppContext } from '../../context'
import type { Connection } from '../../db/client'
import { customerColumns } from '../../db/customers'
import { selectParts } from '../../db/parts'
import { pieceSearchColumns, selectPieces } from '../../db/pieces'
import { selectReadingRows } from '../../db/reading-rows'
import { readingMatches } from '../../db/reading-search'
import { customers, parts } from '../../db/schema/parts'
import { matchesWords } from '../../db/search-text'
import { selectCertificateList } from '../certificates/select-certificates'

const rowsEach = 8

/** The first few of everything that holds every word of the text. */
export function searchShop({ db }: AppContext, text: string): Found {
  if (text === '') return { parts: [], pieces: [], readings: [], customers: [], certificates: [] }
  const partColumns = [parts.number, parts.revision, parts.name, customers.name]
  return {
    parts: selectParts(db, matchesWords(text, partColumns), rowsEach),
    pieces: selectPieces(db, matchesWords(text, pieceSearchColumns), rowsEach),
    readings: selectReadingRows(db, { where: readingMatches(text), limit: rowsEach }),
    customers: selectCustomers(db, text),
    certificates: selectCertificateList(db, { search: text, limit: rowsEach }).rows,
  }
}

function selectCustomers(db: Connection, text: string): Found['customers'] {
  return db
    .select(customerColumns)
    .from(customers)
    .where(matchesWords(text, [customers.name]))
    .orderBy(sql`lower(${customers.name})`)
    .limit(rowsEach)
    .all()
}
