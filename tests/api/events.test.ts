import { sql } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import { inTransaction } from '../../server/db/client'
import { canonicalJson, recordEvent, verifyChain } from '../../server/db/events'
import { startTestApp } from './support'

async function startWithEvents() {
  const test = startTestApp()
  const { agent, me } = await test.signInAs('reviewer')
  const customer = (await agent.post('/api/customers').send({ name: 'Dunmarrow Pumps' })).body
  await agent.patch(`/api/customers/${customer.id}`).send({ email: 'qa@dunmarrow.example' })
  return { ...test, agent, me, customer }
}

/** What somebody with the database file in hand could do. */
function tamper(db: Awaited<ReturnType<typeof startWithEvents>>['context']['db'], statement: string): void {
  db.run(sql`DROP TRIGGER events_no_update`)
  db.run(sql`DROP TRIGGER events_no_delete`)
  db.run(sql`DROP TRIGGER events_in_order`)
  db.run(sql.raw(statement))
}

describe('the trail', () => {
  it('tells newest first who did what to which, from what to what', async () => {
    const { agent, me, customer } = await startWithEvents()
    const { rows } = (
      await agent.get('/api/events').query({ subjectType: 'customer', subjectId: customer.id })
    ).body
    expect(rows).toMatchObject([
      {
        kind: 'customer.changed',
        actorId: me.id,
        actorName: me.name,
        data: { changes: { email: { from: '', to: 'qa@dunmarrow.example' } } },
      },
      { kind: 'customer.added', data: { name: 'Dunmarrow Pumps' } },
    ])
    const all = (await agent.get('/api/events')).body.rows
    expect(all.map((row: { seq: number }) => row.seq)).toEqual([4, 3, 2, 1])
    expect(JSON.stringify(all)).not.toMatch(/argon2/)
  })

  it('is read page by page', async () => {
    const { agent } = await startWithEvents()
    const first = (await agent.get('/api/events').query({ limit: 3 })).body
    expect(first.next).toBe(2)
    const second = (await agent.get('/api/events').query({ limit: 3, before: first.next })).body
    expect(second).toMatchObject({ rows: [{ seq: 1 }], next: null })
  })

  it('says nothing of a change that was refused', async () => {
    const { agent, context } = await startWithEvents()
    const before = verifyChain(context.db)
    await agent.post('/api/customers').send({ name: 'Dunmarrow Pumps' }).expect(409)
    expect(verifyChain(context.db)).toEqual(before)
  })

  it('hangs together', async () => {
    const { context } = await startWithEvents()
    expect(verifyChain(context.db)).toEqual({ intact: true, count: 4 })
  })

  it('shows where a row was changed, taken out or slipped in', async () => {
    const changes: [string, number][] = [
      [`UPDATE events SET actor_name = 'Somebody' WHERE seq = 2`, 2],
      [`UPDATE events SET data = '{}' WHERE seq = 3`, 3],
      ['DELETE FROM events WHERE seq = 2', 3],
      [
        `INSERT INTO events SELECT 5, at, actor_id, actor_name, kind, subject_type, subject_id, data, prev_hash, hash FROM events WHERE seq = 4`,
        5,
      ],
    ]
    for (const [statement, brokenAt] of changes) {
      const { context } = await startWithEvents()
      tamper(context.db, statement)
      expect(verifyChain(context.db), statement).toEqual({ intact: false, brokenAt })
    }
  })

  it.each([
    ['changing', `UPDATE events SET kind = 'person.added'`],
    ['removing', 'DELETE FROM events'],
    ['replacing', `INSERT OR REPLACE INTO events SELECT * FROM events WHERE seq = 1`],
    [
      'an insert that follows on nothing',
      `INSERT INTO events SELECT 9, at, actor_id, actor_name, kind, subject_type, subject_id, data, prev_hash, hash FROM events WHERE seq = 4`,
    ],
  ])('refuses %s in the database itself', async (_name, statement) => {
    const { context } = await startWithEvents()
    expect(() => context.db.$client.exec(statement)).toThrow(/append-only|follow on/)
  })

  it('takes the event back with the change when the transaction fails', async () => {
    const { context } = await startWithEvents()
    const failing = () =>
      inTransaction(context.db, (tx) => {
        recordEvent(tx, {
          kind: 'part.added',
          subject: { type: 'part', id: 'x' },
          actor: null,
          at: context.now(),
        })
        throw new Error('the change failed')
      })
    expect(failing).toThrow('the change failed')
    expect(verifyChain(context.db)).toEqual({ intact: true, count: 4 })
  })
})

describe('canonical JSON', () => {
  it('is the same for the same content, and reads back as it', () => {
    expect(canonicalJson({ b: [1, { d: null, c: 'x' }], a: undefined })).toBe('{"b":[1,{"c":"x","d":null}]}')
    expect(canonicalJson({ z: 1, a: 2 })).toBe(canonicalJson({ a: 2, z: 1 }))
  })
})
