import { AppError } from '../errors'

/** Where a page ended: rows newest first, the id settling which of the same moment comes first. */
export interface PageMark {
  createdAt: string
  id: string
}

export function writePageMark(row: PageMark): string {
  return `${row.createdAt}~${row.id}`
}

export function parsePageMark(mark: string): PageMark {
  const [createdAt, id, ...rest] = mark.split('~')
  if (!createdAt || !id || rest.length > 0) throw new AppError('invalidInput', { log: 'page mark' })
  return { createdAt, id }
}

/** One page out of rows of which one more than `limit` was asked for. */
export function cutPage<Row extends PageMark>(
  rows: Row[],
  limit: number,
): { rows: Row[]; next: string | null } {
  if (rows.length <= limit) return { rows, next: null }
  const page = rows.slice(0, limit)
  return { rows: page, next: writePageMark(page[limit - 1]) }
}
