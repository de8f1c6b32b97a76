import type { EventList, EventListQuery } from '@shared/schemas/events'
import { and, desc, eq, lt } from 'drizzle-orm'
import type { AppContext } from '../../context'
import type { EventSubject } from '../../db/event-kinds'
import { events } from '../../db/schema/events'

/** The trail, newest first: of everything, or of one thing. */
export function listEvents({ db }: AppContext, query: EventListQuery): EventList {
  const rows = db
    .select()
    .from(events)
    .where(
      and(
        // An unknown kind of thing simply has no events.
        query.subjectType ? eq(events.subjectType, query.subjectType as EventSubject) : undefined,
        query.subjectId ? eq(events.subjectId, query.subjectId) : undefined,
        query.before ? lt(events.seq, query.before) : undefined,
      ),
    )
    .orderBy(desc(events.seq))
    .limit(query.limit + 1)
    .all()
    .map(({ prevHash: _prevHash, ...event }) => event)
  const page = rows.slice(0, query.limit)
  return { rows: page, next: rows.length > query.limit ? page[page.length - 1].seq : null }
}
