import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { results } from '../../server/db/schema/results'
import {
  blankConditions,
  blankSetUp,
  bowedMarks,
  lampBandUm,
  mark,
  startAtBench,
  takeMeasuredReading,
  takeReading,
} from './readings-support'

/** Of a cylinder bowed by one band at the rim, over what the edge band of 1 mm leaves of 25 mm. */
const oneBandBowUm = lampBandUm * (24 / 25) ** 2

describe('computing a result', () => {
  it('gives the flatness of the traced bands, its uncertainty, and high or hollow by the press arrow', async () => {
    const bench = await startAtBench()
    const { fullResult } = await takeMeasuredReading(bench, 1)
    expect(fullResult).toMatchObject({
      outcome: 'figure',
      mode: 'traced',
      marksVersion: 1,
      verdict: 'conforms',
      bandUm: lampBandUm,
    })
    expect(fullResult?.minimumZoneUm).toBeCloseTo(oneBandBowUm, 2)
    expect(fullResult?.flatnessUm).toBe(fullResult?.minimumZoneUm)
    expect(fullResult?.sagittaUm).toBeLessThan(0)
    expect(fullResult?.expandedUncertaintyUm).toBeLessThan(0.05)
    expect(fullResult?.figure?.notStated).toContain('referenceFlat')
  })

  it('judges by the face’s own rule', async () => {
    const bench = await startAtBench()
    const { fullResult } = await takeMeasuredReading(bench, 3)
    expect(fullResult?.verdict).toBe('doesNotConform')
  })

  it('keeps a refusal as well, with what is missing and no number', async () => {
    const bench = await startAtBench()
    const reading = await takeReading(bench)
    await mark(bench, reading, bowedMarks(1, [0, 1]))
    const answer = await bench.inspector.agent.post(`/api/readings/${reading.id}/compute`).expect(200)
    expect(answer.body).toMatchObject({
      outcome: 'refused',
      flatnessUm: null,
      expandedUncertaintyUm: null,
      figure: null,
      verdict: 'noVerdict',
    })
    expect(answer.body.findings.map((found: { severity: string }) => found.severity)).toContain('refusal')
    expect(bench.context.db.select().from(results).all()).toHaveLength(1)
  })

  it('adds beside what was computed before, which stays as it was', async () => {
    const bench = await startAtBench()
    const reading = await takeMeasuredReading(bench, 1)
    await mark(bench, reading, bowedMarks(2), 1)
    const second = await bench.inspector.agent.post(`/api/readings/${reading.id}/compute`).expect(200)
    const stored = bench.context.db.select().from(results).all()
    expect(stored.map((row) => row.marksVersion).sort()).toEqual([1, 2])
    const shown = await bench.inspector.agent.get(`/api/readings/${reading.id}`).expect(200)
    expect(shown.body.result.id).toBe(second.body.id)
  })

  it('gives the same figures to the last digit when it is done again', async () => {
    const bench = await startAtBench()
    const reading = await takeMeasuredReading(bench, 1)
    const again = await bench.inspector.agent.post(`/api/readings/${reading.id}/compute`).expect(200)
    expect(again.body.figure).toEqual(reading.fullResult?.figure)
  })

  it('asks for the light source and the outline when they are missing', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const reading = await takeReading(bench)
    const unmarked = await agent.post(`/api/readings/${reading.id}/compute`)
    await agent.patch(`/api/readings/${reading.id}`).send({ setUp: blankSetUp }).expect(200)
    const unlit = await agent.post(`/api/readings/${reading.id}/compute`)
    expect([unmarked.status, unlit.status]).toEqual([400, 400])
    expect(unmarked.body.error.fields['marks.outline']).toMatch(/outline/)
    expect(unlit.body.error.fields['setUp.lightSourceId']).toMatch(/light source/)
  })
})

describe('a figure of a set-up that was changed since', () => {
  it('is said to be stale until it is computed again, and then holds what is stated now', async () => {
    const bench = await startAtBench()
    const { agent } = bench.inspector
    const reading = await takeMeasuredReading(bench, 1)
    expect(reading.figureIsStale).toBe(false)
    expect(reading.fullResult?.figure?.notStated).toEqual(expect.arrayContaining(['repeat', 'outline']))
    const conditions = {
      ...blankConditions,
      edgePlacementUMm: 0.2,
      repeats: { standardDeviationUm: 0.03, count: 4 },
    }
    const path = `/api/readings/${reading.id}`
    const changed = await agent.patch(path).send({ conditions }).expect(200)
    expect(changed.body.figureIsStale).toBe(true)
    await agent.post(`${path}/compute`).expect(200)
    const again = await agent.get(path).expect(200)
    expect(again.body.figureIsStale).toBe(false)
    expect(again.body.fullResult.figure.notStated).not.toContain('repeat')
    expect(again.body.fullResult.figure.notStated).not.toContain('outline')
    expect(again.body.fullResult.expandedUncertaintyUm).toBeGreaterThan(
      reading.fullResult?.expandedUncertaintyUm ?? 0,
    )
  })

  it('is stale as well when the lamp is found to have another wavelength', async () => {
    const bench = await startAtBench()
    const reading = await takeMeasuredReading(bench, 1)
    const administrator = await bench.signInAs('admin')
    const lamp = await administrator.agent.get('/api/equipment').expect(200)
    const row = lamp.body.rows.find((item: { id: string }) => item.id === bench.lightSourceId)
    await administrator.agent
      .patch(`/api/equipment/${row.id}`)
      .send({ details: { ...row.details, wavelengthNm: 546.1 } })
      .expect(200)
    const shown = await bench.inspector.agent.get(`/api/readings/${reading.id}`).expect(200)
    expect(shown.body.figureIsStale).toBe(true)
  })
})

describe('repeats', () => {
  it('are stated with their spread and their number, or not at all', async () => {
    const bench = await startAtBench()
    const reading = await takeReading(bench)
    const answer = await bench.inspector.agent
      .patch(`/api/readings/${reading.id}`)
      .send({ conditions: { ...blankConditions, repeats: { standardDeviationUm: 0.03 } } })
    expect(answer.status).toBe(400)
    expect(answer.body.error.fields['conditions.repeats.count']).toMatch(/how many repeats/)
  })
})

describe('the height map picture', () => {
  it('is clear off the face, dark where it is low and light where it is high', async () => {
    const bench = await startAtBench()
    const { id } = await takeMeasuredReading(bench, 1)
    const answer = await bench.inspector.agent.get(`/api/readings/${id}/map.png?size=200`).expect(200)
    expect(answer.type).toBe('image/png')
    const { data, info } = await sharp(answer.body).raw().toBuffer({ resolveWithObject: true })
    expect([info.width, info.height, info.channels]).toEqual([200, 200, 4])
    const at = (x: number, y: number) => [...data.subarray((y * 200 + x) * 4, (y * 200 + x) * 4 + 4)]
    const lightness = ([red, green, blue]: number[]) => red + green + blue
    expect(at(2, 2)[3]).toBe(0)
    expect(at(100, 100)[3]).toBe(255)
    expect(lightness(at(100, 100))).toBeLessThan(lightness(at(8, 100)))
  })

  it('is asked for again only when there is a newer result', async () => {
    const bench = await startAtBench()
    const { id } = await takeMeasuredReading(bench, 1)
    const { agent } = bench.inspector
    const first = await agent.get(`/api/readings/${id}/map.png`).expect(200)
    await agent.get(`/api/readings/${id}/map.png`).set('If-None-Match', first.headers.etag).expect(304)
    await agent.post(`/api/readings/${id}/compute`).expect(200)
    await agent.get(`/api/readings/${id}/map.png`).set('If-None-Match', first.headers.etag).expect(200)
  })

  it('is not there before the first figure', async () => {
    const bench = await startAtBench()
    const { id } = await takeReading(bench)
    const answer = await bench.inspector.agent.get(`/api/readings/${id}/map.png`)
    expect([answer.status, answer.body.error.message]).toEqual([404, expect.stringMatching(/Compute/)])
  })
})
