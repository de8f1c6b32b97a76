import type { ReadingList, ReadingListQuery } from '@shared/schemas/readings'
import { readingStateSchema } from '@shared/workflow/reading-states'
import { and, eq, inArray, type SQL, sql } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { cutPage, parsePageMark } from '../../db/paging'
import { olderThan, selectReadingRows } from '../../db/reading-rows'
import { readingMatches } from '../../db/reading-search'
import { readings } from '../../db/schema/readings'
import { invalidField } from '../../errors'

/** Readings, newest first. `state` may name several, with commas between. */
export function listReadings({ db }: AppContext, actor: Actor, query: ReadingListQuery): ReadingList {
  const where = and(
    query.state === undefined ? undefined : inStates(query.state),
    query.mine === 'true' ? eq(readings.takenById, actor.id) : undefined,
    query.pieceId === undefined ? undefined : eq(readings.pieceId, query.pieceId),
    query.before === undefined ? undefined : olderThan(parsePageMark(query.before)),
    readingMatches(query.search),
  )
  return cutPage(selectReadingRows(db, { where, limit: query.limit + 1 }), query.limit)
}

function inStates(text: string): SQL {
  const states = text.split(',').map((state) => {
    const parsed = readingStateSchema.safeParse(state)
    if (!parsed.success) throw invalidField('state', { key: 'reading.state.unknown' })
    return parsed.data
  })
  // One state alone is read along its index, already in order. Of several, the index would give all of them to be
  // sorted, forty times the work of one page; the plus sign keeps SQLite from it.
  return states.length === 1 ? eq(readings.state, states[0]) : inArray(sql`+${readings.state}`, states)
}
