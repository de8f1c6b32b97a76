import { may, type Role, roleSchema } from '@shared/access/permissions'
import { describe, expect, it } from 'vitest'
import { personRoles } from '../../server/db/schema/people'
import type { ApiRoute } from '../../server/routes/api-router'
import { startTestApp } from './support'

/** What the API promises, written down apart from the routes: loosening one has to be said here too. */
const promised = `
  GET    /health                        anyone
  POST   /session                       anyone
  GET    /session                       signedIn
  DELETE /session                       signedIn
  PUT    /session/password              signedIn
  GET    /people                        person:read
  POST   /people                        person:manage
  PATCH  /people/:id                    person:manage
  GET    /settings                      shop:read
  PATCH  /settings                      settings:edit
  GET    /customers                     shop:read
  POST   /customers                     part:edit
  PATCH  /customers/:id                 part:edit
  GET    /parts                         shop:read
  POST   /parts                         part:edit
  GET    /parts/:id                     shop:read
  PATCH  /parts/:id                     part:edit
  POST   /parts/:id/faces               part:edit
  PATCH  /faces/:id                     part:edit
  POST   /lots                          piece:create
  GET    /pieces                        shop:read
  GET    /pieces.csv                    shop:read
  POST   /pieces                        piece:create
  GET    /pieces/:id                    shop:read
  GET    /equipment                     shop:read
  POST   /equipment                     equipment:edit
  PATCH  /equipment/:id                 equipment:edit
  GET    /readings                      shop:read
  GET    /readings.csv                  shop:read
  POST   /readings                      reading:create
  GET    /readings/:id                  shop:read
  PATCH  /readings/:id                  reading:edit-own
  PUT    /readings/:id/marks            reading:edit-own
  POST   /readings/:id/compute          reading:edit-own
  POST   /readings/:id/send             reading:send-own
  POST   /readings/:id/reopen           reading:send-own
  GET    /readings/:id/map.png          shop:read
  GET    /readings/:id/review           shop:read
  POST   /readings/:id/agree            reading:review
  POST   /readings/:id/send-back        reading:review
  POST   /readings/:id/set-aside        reading:set-aside
  POST   /readings/:id/remarks          reading:review
  POST   /remarks/:id/answers           remark:answer
  POST   /remarks/:id/close             reading:review
  POST   /pieces/:id/dispositions       piece:dispose
  GET    /certificates                  shop:read
  GET    /certificates.csv              shop:read
  GET    /certificates/:id              shop:read
  GET    /certificates/:id/page         shop:read
  GET    /certificates/:id/pdf          shop:read
  POST   /readings/:id/certificate      certificate:issue
  POST   /certificates/:id/withdraw     certificate:issue
  GET    /check/:code                   anyone
  POST   /readings/:id/photos           photo:upload
  DELETE /readings/:id/photos/:photoId  photo:upload
  GET    /photos/:sha256/preview        shop:read
  GET    /search                        shop:read
  GET    /home                          shop:read
  GET    /events                        event:read
`

type TestApp = ReturnType<typeof startTestApp>

const line = ({ method, path, needs }: ApiRoute) => `${method.toUpperCase()} ${path} ${needs}`
const promisedLines = promised
  .trim()
  .split('\n')
  .map((row) => row.trim().replace(/\s+/g, ' '))

/** Asks for something that isn't there, with nothing in hand: whoever may ask is told that, nobody else is. */
function knock(agent: ReturnType<TestApp['agent']>, { method, path }: ApiRoute) {
  return agent[method](`/api${path.replace(/:\w+/g, 'nothing')}`).send({})
}

function mayCall(roles: readonly Role[], { needs }: ApiRoute): boolean {
  return needs === 'anyone' || needs === 'signedIn' || may(roles, needs)
}

describe('every route of the API', () => {
  it('is declared with the permission that was promised', () => {
    const { app } = startTestApp()
    expect(app.routes.map(line).sort()).toEqual([...promisedLines].sort())
  })

  it('refuses whoever is not signed in, unless it is for anyone', async () => {
    const test = startTestApp()
    for (const route of test.app.routes) {
      const { status, body } = await knock(test.agent(), route)
      const refused = status === 401 && body.error.code === 'notSignedIn'
      expect(refused, line(route)).toBe(route.needs !== 'anyone')
      expect(status, line(route)).toBeLessThan(500)
    }
  })

  it.each(roleSchema.options)(
    'lets a person with the role %s do what shared/access says, and no more',
    async (role) => {
      await expectGuarded(startTestApp(), [role])
    },
  )

  it('lets a person with every role do everything', async () => {
    await expectGuarded(startTestApp(), roleSchema.options)
  })

  it('lets a person who has lost every role do nothing of the shop', async () => {
    const test = startTestApp()
    await expectGuarded(test, [], () => test.context.db.delete(personRoles).run())
  })
})

async function expectGuarded(test: TestApp, roles: readonly Role[], afterSignIn = () => {}): Promise<void> {
  for (const route of test.app.routes) {
    // A new person each time: some routes end the session that asks.
    const { agent } = await test.signInAs(...(roles.length > 0 ? roles : (['inspector'] as const)))
    afterSignIn()
    const { status, body } = await knock(agent, route)
    const refused = status === 401 || status === 403
    expect(refused && body.error.code !== 'badCredentials', line(route)).toBe(!mayCall(roles, route))
    if (refused) expect(body.error.code, line(route)).toBe('notAllowed')
    expect(status, line(route)).toBeLessThan(500)
  }
}

describe('a path that is not there', () => {
  it('is answered in the same shape as every refusal', async () => {
    const answer = await startTestApp().agent().get('/api/nothing/here')
    expect(answer.status).toBe(404)
    expect(answer.body.error).toMatchObject({ code: 'notFound', message: expect.stringMatching(/search/) })
  })

  it('that cannot be read, or a body that is not JSON, is the caller’s fault and never ours', async () => {
    const test = startTestApp()
    const { agent } = await test.signInAs('inspector')
    const garbled = await agent.get('/api/parts/%E0%A4%A')
    const notJson = await agent.post('/api/parts').set('Content-Type', 'application/json').send('{"number":')
    expect([garbled.status, notJson.status]).toEqual([400, 400])
    expect(notJson.body.error.code).toBe('invalidInput')
  })
})
