import { stringify } from 'csv-stringify/sync'

export type CsvCell = string | number | null

/**
 * A table as CSV (RFC 4180) for spreadsheets: a byte order mark so that they read it as UTF-8, and cells that would
 * be run as a formula made harmless by an apostrophe.
 */
export function writeCsv(heads: readonly string[], rows: readonly (readonly CsvCell[])[]): string {
  return stringify([heads, ...rows] as CsvCell[][], {
    bom: true,
    escape_formulas: true,
    record_delimiter: 'windows',
  })
}
