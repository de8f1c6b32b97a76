import type { Response } from 'express'

/** A table to be saved as a file of that name. */
export function sendCsv(response: Response, name: string, csv: string): void {
  response
    .type('text/csv; charset=utf-8')
    .set('Content-Disposition', `attachment; filename="${name}.csv"`)
    .set('Cache-Control', 'private, no-store')
    .send(csv)
}
