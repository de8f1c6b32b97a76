import supertest from 'supertest'
import { describe, expect, it } from 'vitest'
import type { AppContext } from '../../server/context'
import { sessions } from '../../server/db/schema/people'
import { addPerson } from '../../server/use-cases/people/add-person'
import { startTestApp, testPassword } from './support'

const maren = {
  name: 'Maren Oldacre',
  email: 'maren@quillmere.example',
  password: testPassword,
  roles: ['inspector' as const],
}

async function startWithMaren(variables?: Record<string, string>) {
  const test = startTestApp(variables)
  const person = await addPerson(test.context, null, maren)
  return { ...test, person }
}

const signIn = (
  test: Pick<ReturnType<typeof startTestApp>, 'agent'>,
  password = testPassword,
  email = maren.email,
) => test.agent().post('/api/session').send({ email, password })

describe('signing in', () => {
  it('says who one is, and remembers it by a cookie that scripts and other sites cannot use', async () => {
    const test = await startWithMaren()
    const agent = test.agent()
    const answer = await agent
      .post('/api/session')
      .send({ email: ' Maren@Quillmere.example ', password: testPassword })
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({ name: maren.name, roles: ['inspector'], plainNetwork: false })
    expect(answer.headers['set-cookie'][0]).toMatch(/^lapwing_session=.+; HttpOnly; .*SameSite=Lax/)
    expect(answer.headers['set-cookie'][0]).not.toContain('Secure')
    expect((await agent.get('/api/session')).body).toEqual(answer.body)
  })

  it('keeps in the database nothing that would sign anybody in', async () => {
    const test = await startWithMaren()
    const answer = await signIn(test)
    const token = /lapwing_session=([^;]+)/.exec(answer.headers['set-cookie'][0])?.[1]
    const [stored] = test.context.db.select().from(sessions).all()
    expect(stored.id).toMatch(/^[0-9a-f]{64}$/)
    const withStored = await test.agent().get('/api/session').set('Cookie', `lapwing_session=${stored.id}`)
    const withToken = await test.agent().get('/api/session').set('Cookie', `lapwing_session=${token}`)
    expect([withStored.status, withToken.status]).toEqual([401, 200])
  })

  it('answers an unknown account and a wrong password alike', async () => {
    const test = await startWithMaren()
    const wrong = await signIn(test, 'not the password')
    const unknown = await signIn(test, testPassword, 'nobody@quillmere.example')
    expect(wrong.status).toBe(401)
    expect(unknown.status).toBe(401)
    expect(unknown.body).toEqual(wrong.body)
  })

  it('refuses somebody who is no longer active, with the same answer', async () => {
    const test = await startWithMaren()
    const { agent: admin } = await test.signInAs('admin')
    const { agent } = await signedInMaren(test)
    await admin.patch(`/api/people/${test.person.id}`).send({ active: false }).expect(200)
    expect((await agent.get('/api/session')).status).toBe(401)
    const again = await signIn(test)
    expect(again.body.error.code).toBe('badCredentials')
  })

  it('ends with signing out', async () => {
    const test = await startWithMaren()
    const { agent, token } = await signedInMaren(test)
    await agent.delete('/api/session').expect(204)
    const replayed = await test.agent().get('/api/session').set('Cookie', `lapwing_session=${token}`)
    expect(replayed.status).toBe(401)
    expect(test.context.db.select().from(sessions).all()).toEqual([])
  })

  it('names the fields at fault', async () => {
    const test = startTestApp()
    const answer = await test.agent().post('/api/session').send({ email: 'not an address' })
    expect(answer.status).toBe(400)
    expect(answer.body.error.fields).toEqual({
      email: 'This is not an e-mail address. Give one such as name@example.com.',
      password: 'This is needed.',
    })
  })
})

async function signedInMaren(test: { agent: ReturnType<typeof startTestApp>['agent']; context: AppContext }) {
  const agent = test.agent()
  const answer = await agent
    .post('/api/session')
    .send({ email: maren.email, password: testPassword })
    .expect(200)
  return { agent, token: /lapwing_session=([^;]+)/.exec(answer.headers['set-cookie'][0])?.[1] }
}

describe('changing one’s own password', () => {
  it('ends every other session and keeps this one', async () => {
    const test = await startWithMaren()
    const here = await signedInMaren(test)
    const elsewhere = await signedInMaren(test)
    const next = 'lift the flat and lay it'
    await here.agent.put('/api/session/password').send({ current: testPassword, next }).expect(204)
    expect((await here.agent.get('/api/session')).status).toBe(200)
    expect((await elsewhere.agent.get('/api/session')).status).toBe(401)
    expect((await signIn(test)).status).toBe(401)
    expect((await signIn(test, next)).status).toBe(200)
  })

  it('needs the present one', async () => {
    const test = await startWithMaren()
    const { agent } = await signedInMaren(test)
    const answer = await agent
      .put('/api/session/password')
      .send({ current: 'a guess', next: 'long enough to be one' })
    expect(answer.status).toBe(400)
    expect(answer.body.error.fields.current).toBe('This is not your present password.')
  })
})

describe('a plain network', () => {
  // Without TLS a forwarded request comes from another machine, whatever its last hop.
  const tablet = { 'X-Forwarded-For': '192.168.1.20' }

  it('lets nobody sign in until the administrator allows it, and then warns', async () => {
    const test = await startWithMaren()
    const refused = await signIn(test).set(tablet)
    expect(refused.status).toBe(403)
    expect(refused.body.error.code).toBe('plainNetwork')

    const { agent: admin } = await test.signInAs('admin')
    await admin.patch('/api/settings').send({ allowPlainNetwork: true }).expect(200)
    const allowed = await signIn(test).set(tablet)
    expect(allowed.status).toBe(200)
    expect(allowed.body.plainNetwork).toBe(true)
  })

  it('carries no session any more once it is no longer allowed', async () => {
    const test = await startWithMaren()
    const { agent: admin } = await test.signInAs('admin')
    const { agent } = await signedInMaren(test)
    await admin.patch('/api/settings').send({ allowPlainNetwork: true }).expect(200)
    expect((await agent.get('/api/session').set(tablet)).status).toBe(200)
    await admin.patch('/api/settings').send({ allowPlainNetwork: false }).expect(200)
    expect((await agent.get('/api/session').set(tablet)).status).toBe(401)
  })

  it('is no matter behind a proxy that speaks TLS, and the cookie is Secure', async () => {
    const test = await startWithMaren({ LAPWING_TLS: 'proxy' })
    const answer = await signIn(test).set({ ...tablet, 'X-Forwarded-Proto': 'https' })
    expect(answer.status).toBe(200)
    expect(answer.headers['set-cookie'][0]).toContain('; Secure')
    expect(answer.body.plainNetwork).toBe(false)
    const plain = await signIn(test).set({ ...tablet, 'X-Forwarded-Proto': 'http' })
    expect(plain.body.error.code).toBe('plainNetwork')
  })
})

describe('a change from elsewhere', () => {
  it('is refused when the browser says that another site sent it', async () => {
    const test = await startWithMaren()
    const answer = await signIn(test).set('Sec-Fetch-Site', 'cross-site')
    expect(answer.status).toBe(403)
    expect(answer.body.error.code).toBe('crossOrigin')
  })

  it('is refused by its Origin where the browser says no more, and when it says nothing', async () => {
    const test = await startWithMaren()
    const post = () =>
      supertest(test.app.express).post('/api/session').set('Host', 'lapwing.shop:3000').send(maren)
    expect((await post().set('Origin', 'http://other.example')).status).toBe(403)
    expect((await post().set('Origin', 'https://lapwing.shop:3000')).status).toBe(403)
    expect((await post()).status).toBe(403)
    expect((await post().set('Origin', 'http://lapwing.shop:3000')).status).toBe(200)
  })
})
