import { and, or, type SQL, type SQLWrapper, sql } from 'drizzle-orm'

/** Rows in which every word of the text stands in one column or another; undefined when there is no word. */
export function matchesWords(text: string | undefined, columns: readonly SQLWrapper[]): SQL | undefined {
  return matchesEach(text, (word) => or(...columns.map((column) => contains(column, word))))
}

/** Rows that match every word of the text in the way given; undefined when there is no word. */
export function matchesEach(
  text: string | undefined,
  matches: (word: string) => SQL | undefined,
): SQL | undefined {
  const words = (text ?? '').split(/\s+/).filter((word) => word !== '')
  return and(...words.map(matches))
}

/** Whether the column holds the word, in capitals or not. */
export function contains(column: SQLWrapper, word: string): SQL {
  const pattern = `%${word.replace(/[\\%_]/g, '\\$&')}%`
  return sql`${column} LIKE ${pattern} ESCAPE '\\'`
}
