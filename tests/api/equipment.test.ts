import { describe, expect, it } from 'vitest'
import { startTestApp } from './support'

const lamp = {
  name: 'Sodium lamp 1',
  description: '',
  details: { kind: 'lightSource', wavelengthNm: 589.3, relativeU: null, lamp: 'sodium' },
  inService: true,
  calibration: null,
}

async function startWithLamp() {
  const { signInAs } = startTestApp()
  const { agent } = await signInAs('qa')
  const added = (await agent.post('/api/equipment').send(lamp).expect(201)).body
  return { agent, added }
}

describe('equipment', () => {
  it('is listed by its kind', async () => {
    const { agent, added } = await startWithLamp()
    const thermometer = { ...lamp, name: 'Probe', details: { kind: 'thermometer', uC: 0.1 } }
    await agent.post('/api/equipment').send(thermometer).expect(201)
    expect((await agent.get('/api/equipment?kind=lightSource')).body.rows).toEqual([added])
    expect((await agent.get('/api/equipment')).body.rows).toHaveLength(2)
    expect((await agent.get('/api/equipment?kind=hammer')).status).toBe(400)
  })

  it('falls due on the day of its new calibration', async () => {
    const { agent, added } = await startWithLamp()
    const calibration = {
      laboratory: 'Lab',
      certificateNumber: '7',
      calibratedOn: '2026-01-05',
      dueOn: '2026-11-20',
    }
    const changed = await agent.patch(`/api/equipment/${added.id}`).send({ calibration })
    expect(changed.body).toEqual({ ...added, calibration })
    expect((await agent.get('/api/home')).body.due).toEqual([
      { equipment: changed.body, dueOn: '2026-11-20', daysLeft: 18 },
    ])
    await agent.patch(`/api/equipment/${added.id}`).send({ description: 'by the window' }).expect(200)
    expect((await agent.get('/api/home')).body.due).toHaveLength(1)
    await agent.patch(`/api/equipment/${added.id}`).send({ calibration: null }).expect(200)
    expect((await agent.get('/api/home')).body.due).toEqual([])
  })

  it('stays of its kind, and keeps a name of its own', async () => {
    const { agent, added } = await startWithLamp()
    const turned = await agent
      .patch(`/api/equipment/${added.id}`)
      .send({ details: { kind: 'thermometer', uC: null } })
    expect(turned.body.error.fields).toHaveProperty(['details.kind'])
    const clash = await agent.post('/api/equipment').send(lamp)
    expect(clash.body.error.message).toBe('There is already equipment named Sodium lamp 1.')
  })
})

describe('settings', () => {
  it('are the first ones until the administrator changes some', async () => {
    const { signInAs } = startTestApp()
    const { agent } = await signInAs('admin')
    const first = (await agent.get('/api/settings')).body
    expect(first).toMatchObject({ displayUnit: 'um', allowPlainNetwork: false, onePersonShop: false })
    const changed = await agent.patch('/api/settings').send({ shopName: 'Quillmere Lapping Works' })
    expect(changed.body).toEqual({ ...first, shopName: 'Quillmere Lapping Works' })
    expect((await agent.get('/api/session')).body.shop.name).toBe('Quillmere Lapping Works')
    expect((await agent.patch('/api/settings').send({ shopName: ' ' })).body.error.fields).toEqual({
      shopName: 'Give the shop a name.',
    })
  })
})
