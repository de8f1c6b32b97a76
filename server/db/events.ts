import { createHash } from 'node:crypto'
import { asc, desc } from 'drizzle-orm'
import type { Connection, Tx } from './client'
import type { EventKind, EventSubject } from './event-kinds'
import { events } from './schema/events'

export interface NewEvent {
  kind: EventKind
  subject: { type: EventSubject; id: string }
  /** null for what the program itself did. */
  actor: { id: string; name: string } | null
  /** Plain JSON; never passwords, never whole photographs. */
  data?: Record<string, unknown>
  at: Date
}

export type StoredEvent = typeof events.$inferSelect

/** Adds to the trail, in the transaction of the change that it tells of. */
export function recordEvent(tx: Tx, event: NewEvent): void {
  const last = tx
    .select({ seq: events.seq, hash: events.hash })
    .from(events)
    .orderBy(desc(events.seq))
    .limit(1)
    .get()
  const body = {
    seq: (last?.seq ?? 0) + 1,
    at: event.at.toISOString(),
    actorId: event.actor?.id ?? null,
    actorName: event.actor?.name ?? 'Lapwing',
    kind: event.kind,
    subjectType: event.subject.type,
    subjectId: event.subject.id,
    data: asStored(event.data ?? {}),
  }
  const prevHash = last?.hash ?? ''
  tx.insert(events)
    .values({ ...body, prevHash, hash: hashOf(prevHash, body) })
    .run()
}

export type ChainCheck = { intact: true; count: number } | { intact: false; brokenAt: number }

/** Walks the whole trail; `brokenAt` is the first row that doesn't follow on the one before it. */
export function verifyChain(db: Connection): ChainCheck {
  let prevHash = ''
  let count = 0
  for (const row of db.select().from(events).orderBy(asc(events.seq)).all()) {
    count += 1
    const { hash, prevHash: claimed, ...body } = row
    if (row.seq !== count || claimed !== prevHash || hash !== hashOf(prevHash, body)) {
      return { intact: false, brokenAt: row.seq }
    }
    prevHash = hash
  }
  return { intact: true, count }
}

/** What will be read back: the hash must cover that, and not a Date or an undefined on its way in. */
function asStored(data: Record<string, unknown>): Record<string, unknown> {
  return JSON.parse(JSON.stringify(data))
}

function hashOf(prevHash: string, body: Omit<StoredEvent, 'hash' | 'prevHash'>): string {
  return createHash('sha256').update(prevHash).update(canonicalJson(body)).digest('hex')
}

/** JSON with its keys in order, so that the same content always gives the same bytes. */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`
  if (value !== null && typeof value === 'object') {
    const entries = Object.entries(value)
      .filter(([, item]) => item !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1))
    return `{${entries.map(([key, item]) => `${JSON.stringify(key)}:${canonicalJson(item)}`).join(',')}}`
  }
  return JSON.stringify(value)
}
