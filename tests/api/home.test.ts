import { describe, expect, it } from 'vitest'
import { agreeMeasured, issue, sendMeasured, startWithQa } from './certified'
import { storePiece, storeReading } from './stored-readings'
import { type Agent, startTestApp } from './support'

const day = 24 * 3_600_000
const ids = (rows: { id: string }[]) => rows.map((row) => row.id)
const homeOf = async (agent: Agent) => (await agent.get('/api/home').expect(200)).body

async function startWithPiece() {
  const test = startTestApp()
  const maren = await test.signInAs('inspector')
  const { piece, face } = storePiece(test.context, maren.me.id)
  let number = 0
  const store = (
    state: Parameters<typeof storeReading>[1]['state'],
    takenById = maren.me.id,
    verdict?: 'doesNotConform',
  ) =>
    storeReading(test.context, {
      pieceId: piece.id,
      faceId: face.id,
      takenById,
      state,
      number: ++number,
      verdict,
    })
  return { ...test, maren, piece, face, store }
}

describe('the first page', () => {
  it('shows an inspector their drafts, newest work first, and what was sent back to them', async () => {
    const { maren, signInAs, store } = await startWithPiece()
    const edda = await signInAs('inspector')
    const first = store('draft')
    const second = store('draft')
    const back = store('sentBack')
    store('draft', edda.me.id)
    store('sentBack', edda.me.id)
    store('sentForReview')
    const home = await homeOf(maren.agent)
    expect(ids(home.drafts)).toEqual([second, first])
    expect(ids(home.waiting)).toEqual([back])
  })

  it('shows a reviewer what waits for review, oldest first, but never their own reading', async () => {
    const { signInAs, store } = await startWithPiece()
    const tobias = await signInAs('inspector', 'reviewer')
    const first = store('sentForReview')
    const second = store('sentForReview')
    store('sentForReview', tobias.me.id)
    store('agreed')
    expect(ids((await homeOf(tobias.agent)).waiting)).toEqual([first, second])
  })

  it('shows QA what was agreed and can be certified, the latest of its face only', async () => {
    const bench = await startWithQa()
    const early = await agreeMeasured(bench)
    expect(ids((await homeOf(bench.qa.agent)).waiting)).toEqual([early.id])
    const late = await agreeMeasured(bench)
    expect(ids((await homeOf(bench.qa.agent)).waiting)).toEqual([late.id])
    const both = await bench.signInAs('reviewer', 'qa')
    const own = await sendMeasured(bench)
    await both.agent.post(`/api/readings/${own.id}/agree`).expect(200)
    expect(ids((await homeOf(both.agent)).waiting)).toEqual([])
    await issue(bench.qa, own.id)
    expect(ids((await homeOf(bench.qa.agent)).waiting)).toEqual([])
  })

  it('shows what lately came out of tolerance, and no verdict on drafts', async () => {
    const { maren, store, advance } = await startWithPiece()
    store('agreed', maren.me.id, 'doesNotConform')
    advance(70 * day)
    const lately = store('sentForReview', maren.me.id, 'doesNotConform')
    store('draft', maren.me.id, 'doesNotConform')
    store('agreed')
    const { outOfTolerance } = await homeOf(maren.agent)
    expect(ids(outOfTolerance)).toEqual([lately])
    expect(outOfTolerance[0]).toMatchObject({
      serial: '001',
      partNumber: 'OV-12',
      faceName: 'Top',
      takenBy: { id: maren.me.id },
      result: { verdict: 'doesNotConform', flatnessUm: 0.8 },
    })
  })

  it('shows equipment in service whose calibration is past or falls due within eight weeks', async () => {
    const { signInAs } = startTestApp()
    const { agent } = await signInAs('qa')
    const add = (name: string, dueOn: string | null, inService = true) =>
      agent
        .post('/api/equipment')
        .send({
          name,
          inService,
          details: { kind: 'thermometer', uC: 0.1 },
          calibration: { laboratory: 'Lab', certificateNumber: '1', calibratedOn: null, dueOn },
        })
        .expect(201)
    await add('past', '2026-10-30')
    await add('in eight weeks', '2026-12-28')
    await add('in eight weeks and a day', '2026-12-29')
    await add('out of service', '2026-11-03', false)
    await add('never', null)
    const { due } = await homeOf(agent)
    expect(
      due.map((row: { equipment: { name: string }; daysLeft: number }) => [row.equipment.name, row.daysLeft]),
    ).toEqual([
      ['past', -3],
      ['in eight weeks', 56],
    ])
  })
})

describe('a piece with readings', () => {
  it('shows them oldest first, and in lists its latest that isn’t set aside', async () => {
    const { maren, piece, store } = await startWithPiece()
    const first = store('agreed')
    const second = store('draft')
    const aside = store('setAside')
    const page = (await maren.agent.get(`/api/pieces/${piece.id}`)).body
    expect(ids(page.readings)).toEqual([first, second, aside])
    const { rows } = (await maren.agent.get('/api/pieces')).body
    expect(rows[0].latest.id).toBe(second)
  })

  it('keeps the tolerance that it was judged by when the part’s is changed', async () => {
    const { maren, face, piece, store } = await startWithPiece()
    store('agreed', maren.me.id, 'doesNotConform')
    store('draft', maren.me.id, 'doesNotConform')
    const tolerance = { kind: 'plain', max: { valueUm: 0.9, typed: '0.9' } }
    await maren.agent.patch(`/api/faces/${face.id}`).send({ tolerance }).expect(200)
    const { readings } = (await maren.agent.get(`/api/pieces/${piece.id}`)).body
    expect(readings.map((row: { face: { tolerance: unknown } }) => row.face.tolerance)).toEqual([
      face.tolerance,
      tolerance,
    ])
  })
})

describe('the search', () => {
  it('finds parts, pieces, readings and customers that hold every word', async () => {
    const { maren, piece, store } = await startWithPiece()
    const reading = store('draft')
    const found = (await maren.agent.get('/api/search').query({ q: 'ov-12 ostrey' })).body
    expect(ids(found.parts)).toEqual([piece.partId])
    expect(ids(found.pieces)).toEqual([piece.id])
    expect(ids(found.readings)).toEqual([reading])
    expect(found.customers).toEqual([])
    const customer = (await maren.agent.get('/api/search').query({ q: 'ostrey' })).body.customers
    expect(customer).toMatchObject([{ name: 'Ostrey Valves' }])
  })

  it('finds nothing for nothing', async () => {
    const { maren } = await startWithPiece()
    const found = (await maren.agent.get('/api/search').query({ q: ' ' })).body
    expect(found).toEqual({ parts: [], pieces: [], readings: [], customers: [], certificates: [] })
  })
})
