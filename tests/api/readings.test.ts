import { describe, expect, it } from 'vitest'
import { verifyChain } from '../../server/db/events'
import {
  addEquipmentTo,
  blankConditions,
  bowedMarks,
  mark,
  newReading,
  startAtBench,
  takeMeasuredReading,
  takeReading,
} from './readings-support'
import { storeReading } from './stored-readings'

describe('a new reading', () => {
  it('is a draft of the one who takes it, with the face’s edge band and nothing else marked', async () => {
    const bench = await startAtBench()
    const reading = await takeReading(bench)
    expect(reading).toMatchObject({
      number: 1,
      state: 'draft',
      takenBy: { id: bench.inspector.me.id },
      marks: { outline: null, traces: [], edgeBandMm: 1 },
      marksVersion: 0,
      photos: [],
      result: null,
      fullResult: null,
      mayEdit: true,
      maySend: true,
    })
  })

  it('is counted among those of the same face of the same piece', async () => {
    const bench = await startAtBench()
    await takeReading(bench)
    expect((await takeReading(bench)).number).toBe(2)
  })

  it('is refused for a face of another part, and says so at the field', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const parts = await agent.get('/api/parts').expect(200)
    const other = await agent
      .post('/api/parts')
      .send({ customerId: parts.body.rows[0].customerId, number: 'OTHER', name: 'Other' })
      .expect(201)
    const face = await agent
      .post(`/api/parts/${other.body.id}/faces`)
      .send({ ...parts.body.rows[0].faces[0], name: 'Other face' })
      .expect(201)
    const answer = await agent.post('/api/readings').send({ ...newReading(bench), faceId: face.body.id })
    expect(answer.status).toBe(400)
    expect(answer.body.error.fields.faceId).toMatch(/another part/)
  })

  it('is refused with equipment of another kind in its place', async () => {
    const bench = await startAtBench()
    const reading = newReading(bench)
    const setUp = { ...reading.setUp, referenceFlatId: bench.lightSourceId }
    const answer = await bench.inspector.agent.post('/api/readings').send({ ...reading, setUp })
    expect(answer.status).toBe(400)
    expect(Object.keys(answer.body.error.fields)).toEqual(['setUp.referenceFlatId'])
  })

  it('may correct one that has left draft, of the same face only', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const open = await takeReading(bench)
    const sent = await takeMeasuredReading(bench)
    await agent.post(`/api/readings/${sent.id}/send`).expect(200)
    const correcting = await agent.post('/api/readings').send({ ...newReading(bench), correctsId: sent.id })
    const early = await agent.post('/api/readings').send({ ...newReading(bench), correctsId: open.id })
    expect([correcting.status, correcting.body.correctsId]).toEqual([201, sent.id])
    expect([early.status, early.body.error.fields.correctsId]).toEqual([
      400,
      expect.stringMatching(/Change it/),
    ])
  })
})

describe('a reading of somebody else', () => {
  it('may be looked at, and not be changed', async () => {
    const bench = await startAtBench()
    const reading = await takeReading(bench)
    const { agent } = await bench.signInAs('inspector')
    const seen = await agent.get(`/api/readings/${reading.id}`).expect(200)
    expect(seen.body).toMatchObject({ mayEdit: false, maySend: false })

    const path = `/api/readings/${reading.id}`
    const tries = [
      await agent.patch(path).send({ conditions: blankConditions }),
      await agent.put(`${path}/marks`).send({ basedOnVersion: 0, marks: bowedMarks(1) }),
      await agent.post(`${path}/compute`),
      await agent.post(`${path}/send`),
      await agent.post(`${path}/reopen`),
    ]
    expect(tries.map(({ status, body }) => [status, body.error.code])).toEqual(
      tries.map(() => [403, 'notYours']),
    )
  })
})

describe('set-up and conditions', () => {
  it('may be changed in a draft, each with what it was before in the trail', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const reading = await takeReading(bench)
    const conditions = { ...blankConditions, airTemperatureC: 20.4, note: 'soaked over night' }
    const changed = await agent.patch(`/api/readings/${reading.id}`).send({ conditions }).expect(200)
    expect(changed.body.conditions).toEqual(conditions)
    expect(changed.body.setUp).toEqual(reading.setUp)

    const reviewer = await bench.signInAs('reviewer')
    const trail = await reviewer.agent
      .get(`/api/events?subjectType=reading&subjectId=${reading.id}`)
      .expect(200)
    const event = trail.body.rows.find((row: { kind: string }) => row.kind === 'reading.changed')
    expect(event.data.changes).toEqual({
      airTemperatureC: { from: null, to: 20.4 },
      note: { from: '', to: 'soaked over night' },
    })
  })

  it('refuse a viewing angle that no camera can have', async () => {
    const bench = await startAtBench()
    const reading = await takeReading(bench)
    const setUp = { ...reading.setUp, viewingAngleDeg: 80 }
    const answer = await bench.inspector.agent.patch(`/api/readings/${reading.id}`).send({ setUp })
    expect(answer.status).toBe(400)
    expect(answer.body.error.fields['setUp.viewingAngleDeg']).toMatch(/0 to 75/)
  })
})

describe('marks', () => {
  it('are kept as they are sent, under a new version each time', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const reading = await takeReading(bench)
    const marks = bowedMarks(1)
    const path = `/api/readings/${reading.id}/marks`
    const saved = await agent.put(path).send({ basedOnVersion: 0, marks }).expect(200)
    expect(saved.body).toEqual({ marksVersion: 1, savedAt: expect.stringMatching(/^2026-11-02T/) })
    const shown = await agent.get(`/api/readings/${reading.id}`).expect(200)
    expect(shown.body.marks).toEqual(marks)
  })

  it('that were edited from older ones are refused with who saved the newer', async () => {
    const bench = await startAtBench()
    const reading = await takeReading(bench)
    await mark(bench, reading, bowedMarks(1))
    const stale = await bench.inspector.agent
      .put(`/api/readings/${reading.id}/marks`)
      .send({ basedOnVersion: 0, marks: bowedMarks(2) })
    expect(stale.status).toBe(409)
    expect(stale.body.error).toMatchObject({
      code: 'staleMarks',
      message: expect.stringMatching(/Load the newer marks/),
      details: { currentVersion: 1, savedAt: expect.any(String), savedBy: bench.inspector.me.name },
    })
    const shown = await bench.inspector.agent.get(`/api/readings/${reading.id}`).expect(200)
    expect(shown.body.marks).toEqual(bowedMarks(1))
  })
})

describe('sending for review', () => {
  it('moves a reading with a figure, tells the trail, and closes it for changes', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const reading = await takeMeasuredReading(bench)
    const sent = await agent.post(`/api/readings/${reading.id}/send`).expect(200)
    expect(sent.body).toMatchObject({ state: 'sentForReview', mayEdit: false, maySend: false })

    const late = await agent
      .put(`/api/readings/${reading.id}/marks`)
      .send({ basedOnVersion: 1, marks: bowedMarks(2) })
    const again = await agent.post(`/api/readings/${reading.id}/send`)
    expect([late.body.error.code, again.body.error.code]).toEqual(['notEditable', 'illegalMove'])

    const reviewer = await bench.signInAs('reviewer')
    const trail = await reviewer.agent
      .get(`/api/events?subjectType=reading&subjectId=${reading.id}`)
      .expect(200)
    expect(trail.body.rows[0]).toMatchObject({
      kind: 'reading.sentForReview',
      data: { resultId: reading.fullResult?.id, verdict: 'conforms' },
    })
    expect(verifyChain(bench.context.db).intact).toBe(true)
  })

  it('is refused without a figure, or with one of other marks than the present', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const blank = await takeReading(bench)
    const measured = await takeMeasuredReading(bench)
    await mark(bench, measured, bowedMarks(1.2), 1)
    for (const { id } of [blank, measured]) {
      const answer = await agent.post(`/api/readings/${id}/send`)
      expect([answer.status, answer.body.error.code]).toEqual([409, 'figureMissing'])
    }
    await agent.post(`/api/readings/${measured.id}/compute`).expect(200)
    await agent.post(`/api/readings/${measured.id}/send`).expect(200)
  })

  it('is refused when the set-up, the lamp or the tolerance was changed after the figure', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const qa = await bench.signInAs('qa')
    const reading = await takeMeasuredReading(bench)
    const lamp = { kind: 'lightSource', wavelengthNm: 632.8, relativeU: 0.0001, lamp: 'laser' }
    const changes = [
      () => agent.patch(`/api/readings/${reading.id}`).send({ setUp: { ...reading.setUp, mirrored: true } }),
      () => qa.agent.patch(`/api/equipment/${bench.lightSourceId}`).send({ details: lamp }),
      () => agent.patch(`/api/faces/${bench.faceId}`).send({ tolerance: { kind: 'none' } }),
    ]
    for (const change of changes) {
      expect((await change()).status).toBe(200)
      const answer = await agent.post(`/api/readings/${reading.id}/send`)
      expect(answer.body.error?.code).toBe('figureMissing')
      await agent.post(`/api/readings/${reading.id}/compute`).expect(200)
    }
    await agent.post(`/api/readings/${reading.id}/send`).expect(200)
  })
})

describe('a reading that was sent back', () => {
  it('is opened again by the one who took it, and no other state is', async () => {
    const bench = await startAtBench()
    const { agent, me } = bench.inspector
    const { pieceId, faceId } = bench
    const common = { pieceId, faceId, takenById: me.id }
    const back = storeReading(bench.context, { ...common, state: 'sentBack', number: 1 })
    const agreed = storeReading(bench.context, { ...common, state: 'agreed', number: 2 })
    const opened = await agent.post(`/api/readings/${back}/reopen`).expect(200)
    expect(opened.body).toMatchObject({ state: 'draft', maySend: true })
    const refused = await agent.post(`/api/readings/${agreed}/reopen`)
    expect([refused.status, refused.body.error.code]).toEqual([409, 'illegalMove'])
  })
})

describe('the list of readings', () => {
  it('goes newest first through pages that neither repeat nor leave out', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const taken: string[] = []
    for (let i = 0; i < 5; i++) taken.push((await takeReading(bench)).id)
    const seen: string[] = []
    let before = ''
    do {
      const page = await agent.get(`/api/readings?limit=2${before && `&before=${before}`}`).expect(200)
      seen.push(...page.body.rows.map((row: { id: string }) => row.id))
      before = page.body.next ? encodeURIComponent(page.body.next) : ''
    } while (before)
    expect(seen).toEqual(taken.reverse())
  })

  it('is narrowed by states, by who took them, by piece and by words', async () => {
    const bench = await startAtBench()
    const other = await bench.signInAs('inspector')
    const own = await takeReading(bench)
    const others = await takeReading(bench, other)
    const sent = storeReading(bench.context, {
      pieceId: bench.pieceId,
      faceId: bench.faceId,
      takenById: other.me.id,
      state: 'sentForReview',
      number: 3,
    })
    const ids = async (query: string) => {
      const { body } = await bench.inspector.agent.get(`/api/readings?${query}`).expect(200)
      return body.rows.map((row: { id: string }) => row.id)
    }
    expect(await ids('state=draft')).toEqual([others.id, own.id])
    expect(await ids('state=draft,sentForReview')).toEqual([sent, others.id, own.id])
    expect(await ids('mine=true')).toEqual([own.id])
    expect(await ids(`pieceId=${bench.pieceId}&state=sentForReview`)).toEqual([sent])
    expect(await ids('pieceId=nothing')).toEqual([])
    expect(await ids('search=ostrey valve')).toHaveLength(3)
    expect(await ids('search=ostrey pump')).toEqual([])
  })

  it('refuses a state that there isn’t and a page mark that it never gave', async () => {
    const { inspector } = await startAtBench()
    const state = await inspector.agent.get('/api/readings?state=draft,lost')
    const before = await inspector.agent.get('/api/readings?before=yesterday')
    expect([state.status, before.status]).toEqual([400, 400])
    expect(state.body.error.fields.state).toMatch(/no such state/)
  })
})

describe('what the figure is made of', () => {
  it('takes angle and distance from the camera set-up unless an angle is typed', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const camera = addEquipmentTo(bench, bench.inspector, {
      name: 'Bench camera',
      description: '',
      details: {
        kind: 'cameraSetUp',
        viewingAngleDeg: 60,
        viewingAngleUDeg: 1,
        distanceMm: 400,
        mirrored: false,
      },
      inService: true,
      calibration: null,
    })
    const reading = await takeMeasuredReading(bench)
    const bandUm = async (viewingAngleDeg: number | null) => {
      const setUp = { ...reading.setUp, cameraSetUpId: camera.id, viewingAngleDeg }
      await agent.patch(`/api/readings/${reading.id}`).send({ setUp }).expect(200)
      return (await agent.post(`/api/readings/${reading.id}/compute`).expect(200)).body.bandUm
    }
    expect(await bandUm(null)).toBeCloseTo(0.5893, 6)
    expect(await bandUm(0)).toBeCloseTo(0.29465, 6)
  })
})
