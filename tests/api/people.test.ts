import { describe, expect, it } from 'vitest'
import { startTestApp, testPassword } from './support'

const tobias = {
  name: 'Tobias Fenwright',
  email: 'tobias@quillmere.example',
  password: testPassword,
  roles: ['reviewer'],
}

describe('people', () => {
  it('are added by the administrator, and can then sign in', async () => {
    const { agent, signInAs } = startTestApp()
    const { agent: admin } = await signInAs('admin')
    const added = await admin.post('/api/people').send(tobias)
    expect(added.status).toBe(201)
    expect(added.body).toMatchObject({ name: tobias.name, roles: ['reviewer'], active: true })
    const listed = await admin.get('/api/people')
    expect(listed.body.rows).toContainEqual(added.body)
    expect(JSON.stringify(listed.body)).not.toMatch(/argon2|password/i)
    await agent().post('/api/session').send(tobias).expect(200)
  })

  it('have an e-mail address each', async () => {
    const { signInAs } = startTestApp()
    const { agent: admin } = await signInAs('admin')
    await admin.post('/api/people').send(tobias).expect(201)
    const clash = await admin.post('/api/people').send({ ...tobias, email: 'TOBIAS@quillmere.example' })
    expect(clash.status).toBe(409)
    expect(clash.body.error.fields.email).toBe('There is already an account for tobias@quillmere.example.')
  })

  it('are told what a password needs', async () => {
    const { signInAs } = startTestApp()
    const { agent: admin } = await signInAs('admin')
    const refused = await admin.post('/api/people').send({ ...tobias, password: 'short', roles: [] })
    expect(refused.body.error.fields).toEqual({
      password: 'A password needs 12 characters or more. Several words make a good one.',
      roles: 'Give at least one role.',
    })
  })

  it('lose and gain what their roles allow at once', async () => {
    const { signInAs } = startTestApp()
    const { agent: admin } = await signInAs('admin')
    const inspector = await signInAs('inspector')
    await admin
      .patch(`/api/people/${inspector.me.id}`)
      .send({ roles: ['qa'] })
      .expect(200)
    expect((await inspector.agent.get('/api/events')).status).toBe(200)
    expect((await inspector.agent.post('/api/pieces').send({})).status).toBe(403)
  })

  it('have their sessions ended by a new password', async () => {
    const { signInAs } = startTestApp()
    const { agent: admin } = await signInAs('admin')
    const inspector = await signInAs('inspector')
    await admin.patch(`/api/people/${inspector.me.id}`).send({ password: 'another one, longer' }).expect(200)
    expect((await inspector.agent.get('/api/session')).status).toBe(401)
  })

  it('always have an administrator among them', async () => {
    const { signInAs } = startTestApp()
    const first = await signInAs('admin')
    const self = `/api/people/${first.me.id}`
    expect((await first.agent.patch(self).send({ active: false })).body.error.code).toBe('ownDeactivation')
    const refused = await first.agent.patch(self).send({ roles: ['qa'] })
    expect(refused.body.error.code).toBe('lastAdministrator')
    expect((await first.agent.get('/api/session')).body.roles).toEqual(['admin'])

    const second = await signInAs('admin')
    await second.agent
      .patch(self)
      .send({ roles: ['qa'] })
      .expect(200)
    expect((await first.agent.get('/api/session')).body.roles).toEqual(['qa'])
  })
})
