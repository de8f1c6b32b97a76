import type { NewFace } from '@shared/schemas/parts'
import { describe, expect, it } from 'vitest'
import { type Agent, startTestApp } from './support'

const ringFace: NewFace = {
  name: 'Sealing face',
  size: { shape: 'annulus', diameterMm: 60, boreMm: 40 },
  tolerance: { kind: 'plain', max: { valueUm: 0.6, typed: '2 bands' } },
  reference: 'minimumZone',
  rule: { kind: 'simpleAcceptance', guardFactor: 0 },
  edgeBandMm: 1,
  support: 'free',
  template: null,
}

async function startWithPart() {
  const test = startTestApp()
  const { agent } = await test.signInAs('inspector')
  const customer = (await agent.post('/api/customers').send({ name: 'Dunmarrow Pumps' }).expect(201)).body
  const part = (
    await agent
      .post('/api/parts')
      .send({ customerId: customer.id, number: 'VC-60', revision: 'B', name: 'Seal ring', material: 'SiC' })
      .expect(201)
  ).body
  return { ...test, agent, customer, part }
}

const addPiece = (agent: Agent, partId: string, serial: string) =>
  agent.post('/api/pieces').send({ partId, serial })

describe('a part', () => {
  it('is found by any word of its number, name or customer, with its faces and its count of pieces', async () => {
    const { agent, part } = await startWithPart()
    await agent.post(`/api/parts/${part.id}/faces`).send(ringFace).expect(201)
    await addPiece(agent, part.id, '001').expect(201)
    for (const search of ['', 'vc-60', 'ring dunmarrow', 'sic']) {
      const { rows } = (await agent.get('/api/parts').query({ search })).body
      expect(rows).toEqual([{ ...part, faces: [expect.objectContaining(ringFace)], pieceCount: 1 }])
    }
    expect((await agent.get('/api/parts').query({ search: 'ring ostrey' })).body.rows).toEqual([])
    expect((await agent.get('/api/parts').query({ search: '%' })).body.rows).toEqual([])
  })

  it('has a number and revision of its own, whatever the case', async () => {
    const { agent, part, customer } = await startWithPart()
    const clash = await agent
      .post('/api/parts')
      .send({ customerId: customer.id, number: 'vc-60', revision: 'b', name: 'Other' })
    expect(clash.status).toBe(409)
    expect(clash.body.error.message).toBe('There is already a part vc-60 revision b.')
    expect(clash.body.error.fields).toEqual({ number: clash.body.error.message })

    const next = await agent
      .post('/api/parts')
      .send({ customerId: customer.id, number: 'VC-60', revision: 'C', name: 'Other' })
    expect(next.status).toBe(201)
    const renamed = await agent.patch(`/api/parts/${next.body.id}`).send({ revision: 'B' })
    expect(renamed.body.error.message).toBe('There is already a part VC-60 revision B.')
    expect((await agent.get(`/api/parts/${part.id}`)).body.part).toEqual(part)
  })

  it('keeps what a change doesn’t mention', async () => {
    const { agent, part } = await startWithPart()
    const changed = await agent.patch(`/api/parts/${part.id}`).send({ name: 'Pump seal ring' })
    expect(changed.body).toEqual({ ...part, name: 'Pump seal ring' })
  })

  it('belongs to a customer who is there', async () => {
    const { agent } = await startWithPart()
    const refused = await agent.post('/api/parts').send({ customerId: 'nobody', number: 'X', name: 'Y' })
    expect(refused.status).toBe(400)
    expect(refused.body.error.fields.customerId).toMatch(/no such customer/)
  })
})

describe('a face', () => {
  it('keeps what was typed beside what it means', async () => {
    const { agent, part } = await startWithPart()
    const face = (await agent.post(`/api/parts/${part.id}/faces`).send(ringFace)).body
    expect(face).toEqual({ ...ringFace, id: face.id, partId: part.id })
    const tolerance = { kind: 'plain', max: { valueUm: 0.2946, typed: '11.6 µin' } }
    const changed = await agent.patch(`/api/faces/${face.id}`).send({ tolerance })
    expect(changed.body).toEqual({ ...face, tolerance })
  })

  it('is refused where its sizes or limits make no sense', async () => {
    const { agent, part } = await startWithPart()
    const refused = await agent.post(`/api/parts/${part.id}/faces`).send({
      ...ringFace,
      size: { shape: 'annulus', diameterMm: 40, boreMm: 60 },
      tolerance: { kind: 'plain', max: { valueUm: 0, typed: '0' } },
    })
    expect(refused.body.error.fields).toEqual({
      size: 'The bore must be smaller than the outer diameter.',
      tolerance: 'The tolerance must be more than 0.',
    })
  })

  it('has a name of its own on its part', async () => {
    const { agent, part } = await startWithPart()
    await agent.post(`/api/parts/${part.id}/faces`).send(ringFace).expect(201)
    const clash = await agent.post(`/api/parts/${part.id}/faces`).send({ ...ringFace, name: 'sealing FACE' })
    expect(clash.status).toBe(409)
    expect(clash.body.error.fields.name).toBe('This part already has a face sealing FACE.')
  })

  it('stands in the order in which the faces were added', async () => {
    const { agent, part } = await startWithPart()
    for (const name of ['Front', 'Back', 'Around']) {
      await agent.post(`/api/parts/${part.id}/faces`).send({ ...ringFace, name })
    }
    const { faces } = (await agent.get(`/api/parts/${part.id}`)).body
    expect(faces.map((face: { name: string }) => face.name)).toEqual(['Front', 'Back', 'Around'])
  })
})

describe('a customer', () => {
  it('has a name of their own, and can be changed', async () => {
    const { agent, customer } = await startWithPart()
    const clash = await agent.post('/api/customers').send({ name: 'DUNMARROW PUMPS' })
    expect(clash.body.error.message).toBe('There is already a customer DUNMARROW PUMPS.')
    const changed = await agent.patch(`/api/customers/${customer.id}`).send({ email: 'qa@dunmarrow.example' })
    expect(changed.body).toEqual({ ...customer, email: 'qa@dunmarrow.example' })
    expect((await agent.get('/api/customers')).body.rows).toEqual([changed.body])
  })
})

describe('a piece', () => {
  it('is listed newest first, page by page, none twice and none left out', async () => {
    const { agent, part } = await startWithPart()
    for (const serial of ['001', '002', '003', '004', '005'])
      await addPiece(agent, part.id, serial).expect(201)
    const serials: string[] = []
    let before: string | null | undefined
    do {
      const page = (
        await agent
          .get('/api/pieces')
          .query({ limit: 2, ...(before && { before }) })
          .expect(200)
      ).body
      serials.push(...page.rows.map((row: { serial: string }) => row.serial))
      before = page.next
    } while (before)
    expect(serials).toEqual(['005', '004', '003', '002', '001'])
  })

  it('has a serial of its own within its part', async () => {
    const { agent, part, customer } = await startWithPart()
    await addPiece(agent, part.id, 'A1').expect(201)
    const clash = await addPiece(agent, part.id, 'a1')
    expect(clash.body.error.fields.serial).toBe('Part VC-60 already has a piece a1.')
    const other = await agent
      .post('/api/parts')
      .send({ customerId: customer.id, number: 'VC-61', name: 'Ring' })
    await addPiece(agent, other.body.id, 'A1').expect(201)
  })

  it('goes into a lot of its own part only', async () => {
    const { agent, part, customer } = await startWithPart()
    const lot = (await agent.post('/api/lots').send({ partId: part.id, number: 'L-7' }).expect(201)).body
    const piece = (await agent.post('/api/pieces').send({ partId: part.id, lotId: lot.id, serial: '1' })).body
    expect(piece).toMatchObject({ lotNumber: 'L-7', partNumber: 'VC-60', customerName: 'Dunmarrow Pumps' })

    const other = await agent
      .post('/api/parts')
      .send({ customerId: customer.id, number: 'VC-61', name: 'Ring' })
    const refused = await agent
      .post('/api/pieces')
      .send({ partId: other.body.id, lotId: lot.id, serial: '1' })
    expect(refused.body.error.fields.lotId).toMatch(/another part/)
  })

  it('shows its part, its faces, and neither readings nor certificates yet', async () => {
    const { agent, part } = await startWithPart()
    const face = (await agent.post(`/api/parts/${part.id}/faces`).send(ringFace)).body
    const piece = (await addPiece(agent, part.id, '001')).body
    expect((await agent.get(`/api/pieces/${piece.id}`)).body).toEqual({
      piece,
      part,
      faces: [face],
      readings: [],
      dispositions: [],
      certificates: [],
    })
    expect((await agent.get(`/api/parts/${part.id}`)).body.pieces).toEqual([{ ...piece, latest: null }])
  })
})
