import { stringify } from 'csv-stringify/sync'

export type CsvCell = string | number | null

/** A height in µm to a nanometre: no figure is better. */
export function heightCell(um: number | null | undefined): CsvCell {
  return um === null || um === undefined ? null : Math.round(um * 1000) / 1000
}

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
