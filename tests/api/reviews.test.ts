import type { Role } from '@shared/access/permissions'
import { describe, expect, it } from 'vitest'
import { verifyChain } from '../../server/db/events'
import { events } from '../../server/db/schema/events'
import { bowedMarks, mark, startAtBench, takeMeasuredReading } from './readings-support'
import type { SignedIn } from './support'

/** A reading that was sent for review, and a reviewer. */
async function startReview(bands = 1) {
  const bench = await startAtBench()
  const reading = await takeMeasuredReading(bench, bands)
  await bench.inspector.agent.post(`/api/readings/${reading.id}/send`).expect(200)
  const reviewer = await bench.signInAs('reviewer')
  return { bench, reviewer, path: `/api/readings/${reading.id}`, reading }
}

const place = { x: 410, y: 520 }

async function pin(reviewer: SignedIn, path: string, text = 'Is this band the one it says?') {
  const answer = await reviewer.agent.post(`${path}/remarks`).send({ text, place }).expect(201)
  return answer.body.rows.at(-1)
}

describe('a review', () => {
  it('ends in agreement, which names who agreed and when', async () => {
    const { reviewer, path } = await startReview()
    const agreed = await reviewer.agent.post(`${path}/agree`).expect(200)
    expect(agreed.body.state).toBe('agreed')
    const review = await reviewer.agent.get(`${path}/review`).expect(200)
    expect(review.body.agreed.by.name).toBe(reviewer.me.name)
  })

  it('is never of one’s own reading, unless the shop has one person', async () => {
    const bench = await startAtBench()
    const both = await bench.signInAs('inspector', 'reviewer')
    const reading = await takeMeasuredReading(bench, 1, both)
    const path = `/api/readings/${reading.id}`
    await both.agent.post(`${path}/send`).expect(200)
    const refused = [
      await both.agent.post(`${path}/agree`),
      await both.agent.post(`${path}/send-back`).send({ reason: 'dust' }),
      await both.agent.post(`${path}/set-aside`).send({ cause: 'dust' }),
      await both.agent.post(`${path}/remarks`).send({ text: 'dust' }),
    ]
    expect(refused.map(({ status, body }) => [status, body.error.code])).toEqual(
      refused.map(() => [409, 'ownReading']),
    )
    const seen = await both.agent.get(`${path}/review`).expect(200)
    expect(seen.body).toMatchObject({ refusal: 'ownReading', maySetAside: false })

    const administrator = await bench.signInAs('admin')
    await administrator.agent.patch('/api/settings').send({ onePersonShop: true }).expect(200)
    await both.agent.post(`${path}/agree`).expect(200)
  })

  it('agrees only when every remark is closed', async () => {
    const { bench, reviewer, path } = await startReview()
    const remark = await pin(reviewer, path)
    const early = await reviewer.agent.post(`${path}/agree`)
    expect([early.status, early.body.error.code]).toEqual([409, 'remarksOpen'])
    await bench.inspector.agent
      .post(`/api/remarks/${remark.id}/answers`)
      .send({ text: 'It is: counted twice.' })
      .expect(201)
    const closed = await reviewer.agent.post(`/api/remarks/${remark.id}/close`).expect(200)
    expect(closed.body.rows).toMatchObject([
      { place, answers: [{ text: 'It is: counted twice.' }], closed: { by: { name: reviewer.me.name } } },
    ])
    await reviewer.agent.post(`${path}/agree`).expect(200)
  })

  it('sends back with a reason, and takes the mended reading again', async () => {
    const { bench, reviewer, path, reading } = await startReview()
    const { agent } = bench.inspector
    await pin(reviewer, path)
    const silent = await reviewer.agent.post(`${path}/send-back`).send({ reason: '  ' })
    expect(silent.body.error.fields.reason).toMatch(/why it goes back/)
    const sentBack = await reviewer.agent
      .post(`${path}/send-back`)
      .send({ reason: 'Band 3 is not 3.' })
      .expect(200)
    expect(sentBack.body).toMatchObject({ state: 'sentBack', sentBackReason: 'Band 3 is not 3.' })
    await agent.post(`${path}/reopen`).expect(200)
    await mark(bench, reading, bowedMarks(1), 1)
    await agent.post(`${path}/compute`).expect(200)
    const again = await agent.post(`${path}/send`).expect(200)
    expect(again.body).toMatchObject({ state: 'sentForReview', sentBackReason: null })
  })

  it('can’t be done twice: the second finds the reading moved on', async () => {
    const { reviewer, path } = await startReview()
    await reviewer.agent.post(`${path}/agree`).expect(200)
    const late = [
      await reviewer.agent.post(`${path}/agree`),
      await reviewer.agent.post(`${path}/send-back`).send({ reason: 'too late' }),
      await reviewer.agent.post(`${path}/remarks`).send({ text: 'too late' }),
    ]
    expect(late.map(({ status, body }) => [status, body.error.code])).toEqual(
      late.map(() => [409, 'illegalMove']),
    )
  })

  it('writes every step into the trail, which stays whole', async () => {
    const { bench, reviewer, path } = await startReview()
    const remark = await pin(reviewer, path)
    await reviewer.agent.post(`/api/remarks/${remark.id}/close`).expect(200)
    await reviewer.agent.post(`${path}/agree`).expect(200)
    const kinds = bench.context.db.select({ kind: events.kind }).from(events).all()
    expect(kinds.slice(-3).map(({ kind }) => kind)).toEqual([
      'remark.added',
      'remark.closed',
      'reading.agreed',
    ])
    expect(verifyChain(bench.context.db)).toMatchObject({ intact: true })
  })
})

describe('remarks', () => {
  it('are answered by whoever took the reading or a reviewer, and by nobody else', async () => {
    const { bench, reviewer, path } = await startReview()
    const remark = await pin(reviewer, path)
    const stranger = await bench.signInAs('inspector')
    const answers = `/api/remarks/${remark.id}/answers`
    const refused = await stranger.agent.post(answers).send({ text: 'I think so.' })
    expect([refused.status, refused.body.error.code]).toEqual([403, 'notYours'])
    await reviewer.agent.post(answers).send({ text: 'I looked again.' }).expect(201)
  })

  it('take no more answers once closed', async () => {
    const { bench, reviewer, path } = await startReview()
    const remark = await pin(reviewer, path)
    await reviewer.agent.post(`/api/remarks/${remark.id}/close`).expect(200)
    const late = await bench.inspector.agent.post(`/api/remarks/${remark.id}/answers`).send({ text: 'late' })
    const twice = await reviewer.agent.post(`/api/remarks/${remark.id}/close`)
    expect([late.body.error.code, twice.body.error.code]).toEqual(['remarkClosed', 'remarkClosed'])
  })
})

describe('setting aside', () => {
  it('asks for the cause, which the reviewer then sees among the readings of the face', async () => {
    const { bench, reviewer, path, reading } = await startReview()
    const silent = await reviewer.agent.post(`${path}/set-aside`).send({ cause: '' })
    expect(silent.body.error.fields.cause).toMatch(/cause/)
    await reviewer.agent.post(`${path}/set-aside`).send({ cause: 'Flat was wet.' }).expect(200)
    const second = await takeMeasuredReading(bench, 1)
    const review = await reviewer.agent.get(`/api/readings/${second.id}/review`).expect(200)
    expect(review.body.faceReadings).toMatchObject([
      { id: reading.id, counts: false, setAsideCause: 'Flat was wet.' },
      { id: second.id, counts: true, setAsideCause: null },
    ])
  })

  it('of a draft is its taker’s; of another’s reading it is a reviewer’s', async () => {
    const bench = await startAtBench()
    const reading = await takeMeasuredReading(bench, 1)
    const path = `/api/readings/${reading.id}/set-aside`
    const stranger = await bench.signInAs('inspector')
    const refused = await stranger.agent.post(path).send({ cause: 'no good' })
    expect([refused.status, refused.body.error.code]).toEqual([403, 'notYours'])
    await bench.inspector.agent.post(path).send({ cause: 'Wrong piece.' }).expect(200)
  })
})

describe('readings since the last turn on the lap', () => {
  it('count, and those before it do not', async () => {
    const bench = await startAtBench()
    const before = await takeMeasuredReading(bench, 3)
    const after = await takeMeasuredReading(bench, 1, bench.inspector, { lappedSince: true })
    const again = await takeMeasuredReading(bench, 1)
    const { body } = await bench.inspector.agent.get(`/api/readings/${again.id}/review`).expect(200)
    expect(body.faceReadings.map(({ id, counts }: { id: string; counts: boolean }) => [id, counts])).toEqual([
      [before.id, false],
      [after.id, true],
      [again.id, true],
    ])
  })
})

describe('marks that depart from the face', () => {
  it('are sent only with a reason, which the reviewer sees', async () => {
    const bench = await startAtBench()
    const reading = await takeMeasuredReading(bench, 1)
    const { agent } = bench.inspector
    const path = `/api/readings/${reading.id}`
    await mark(bench, reading, { ...bowedMarks(1), edgeBandMm: 3 }, 1)
    await agent.post(`${path}/compute`).expect(200)
    const silent = await agent.post(`${path}/send`)
    expect([silent.status, silent.body.error.fields.departureReason]).toEqual([
      400,
      expect.stringMatching(/edge band.*Say why/),
    ])
    await agent.post(`${path}/send`).send({ departureReason: 'A burr on the rim.' }).expect(200)
    const review = await agent.get(`${path}/review`).expect(200)
    expect(review.body).toMatchObject({ departures: ['edgeBand'], departureReason: 'A burr on the rim.' })
  })
})

describe('a disposition', () => {
  const rework = { kind: 'rework', reason: 'Back on the lap.' }

  async function agreedReading(bands: number) {
    const { bench, reviewer, path, reading } = await startReview(bands)
    await reviewer.agent.post(`${path}/agree`).expect(200)
    return { bench, reviewer, reading, dispositions: `/api/pieces/${reading.pieceId}/dispositions` }
  }

  it('is of a piece whose agreed reading does not conform, and shows on its page, newest first', async () => {
    const { reviewer, reading, dispositions } = await agreedReading(3)
    await reviewer.agent
      .post(dispositions)
      .send({ ...rework, readingId: reading.id })
      .expect(201)
    const concession = {
      kind: 'concession',
      reason: 'Fits its place.',
      onWordOf: 'customer, letter of 3 November',
    }
    await reviewer.agent
      .post(dispositions)
      .send({ ...concession, readingId: reading.id })
      .expect(201)
    const page = await reviewer.agent.get(`/api/pieces/${reading.pieceId}`).expect(200)
    expect(page.body.dispositions).toMatchObject([concession, rework])
  })

  it('needs somebody’s word for a concession', async () => {
    const { reviewer, reading, dispositions } = await agreedReading(3)
    const answer = await reviewer.agent
      .post(dispositions)
      .send({ kind: 'concession', reason: 'Fits.', readingId: reading.id })
    expect(answer.body.error.fields.onWordOf).toMatch(/who granted/)
  })

  it('is not for a piece that conforms', async () => {
    const { reviewer, reading, dispositions } = await agreedReading(1)
    const answer = await reviewer.agent.post(dispositions).send({ ...rework, readingId: reading.id })
    expect([answer.status, answer.body.error.code]).toEqual([409, 'nothingToDispose'])
  })
})

describe('somebody else’s state', () => {
  it.each<[Role]>([['inspector'], ['qa'], ['admin']])('%s may not review', async (role) => {
    const { bench, path } = await startReview()
    const { agent } = await bench.signInAs(role)
    const tries = [
      await agent.post(`${path}/agree`),
      await agent.post(`${path}/send-back`).send({ reason: 'no' }),
      await agent.post(`${path}/remarks`).send({ text: 'no' }),
    ]
    expect(tries.map(({ status }) => status)).toEqual([403, 403, 403])
  })
})
