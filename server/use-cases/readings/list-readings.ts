import type { ReadingList, ReadingListQuery } from '@shared/schemas/readings'
import { readingStateSchema } from '@shared/workflow/reading-states'
import { and, eq, gte, inArray, lt, notInArray, type SQL, sql } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { cutPage, parsePageMark } from '../../db/paging'
import {
  countReadings,
  newerThan,
  newestFirst,
  olderThan,
  oldestFirst,
  selectReadingRows,
} from '../../db/reading-rows'
import { readingMatches } from '../../db/reading-search'
import { parts, pieces } from '../../db/schema/parts'
import { readings } from '../../db/schema/readings'
import { invalidField } from '../../errors'

/** A page of readings, newest or oldest first, and how many there are. `state` may name several, with commas between. */
export function listReadings({ db }: AppContext, actor: Actor, query: ReadingListQuery): ReadingList {
  const matching = readingsThat(actor, query)
  const isOldest = query.order === 'oldest'
  const mark = query.before === undefined ? undefined : parsePageMark(query.before)
  const beyond = mark && (isOldest ? newerThan(mark) : olderThan(mark))
  const rows = selectReadingRows(db, {
    where: and(matching, beyond),
    orderBy: isOldest ? oldestFirst : newestFirst,
    limit: query.limit + 1,
  })
  return { ...cutPage(rows, query.limit), total: countReadings(db, matching) }
}

/** Every condition of a query but the page. */
export function readingsThat(actor: Actor, query: ReadingListQuery): SQL | undefined {
  return and(
    query.state === undefined ? undefined : inStates(query.state),
    query.mine === 'true' ? eq(readings.takenById, actor.id) : undefined,
    query.pieceId === undefined ? undefined : eq(readings.pieceId, query.pieceId),
    query.customerId === undefined ? undefined : ofCustomer(query.customerId),
    query.verdict === undefined ? undefined : withVerdict(query.verdict),
    query.from === undefined ? undefined : gte(readings.createdAt, query.from),
    query.to === undefined ? undefined : lt(readings.createdAt, dayAfter(query.to)),
    readingMatches(query.search),
  )
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

function ofCustomer(customerId: string): SQL {
  return sql`${readings.pieceId} IN (SELECT ${pieces.id} FROM ${pieces}
    JOIN ${parts} ON ${parts.id} = ${pieces.partId} WHERE ${parts.customerId} = ${customerId})`
}

/** Of a reading's latest result; a draft has none yet. */
function withVerdict(verdict: NonNullable<ReadingListQuery['verdict']>): SQL | undefined {
  return and(eq(readings.verdict, verdict), notInArray(readings.state, ['draft', 'sentBack']))
}

/** A day that isn't in the calendar counts as the next that is. */
function dayAfter(day: string): string {
  const noon = Date.parse(`${day}T12:00:00Z`)
  if (Number.isNaN(noon)) throw invalidField('to', { key: 'day.invalid' })
  return new Date(noon + 24 * 3_600_000).toISOString().slice(0, 10)
}
