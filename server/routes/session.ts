import { ownPasswordChangeSchema, signInSchema } from '@shared/schemas/people'
import type { Request } from 'express'
import { requireActor } from '../auth/actor'
import { addressKey } from '../auth/address'
import { isPlainConnection } from '../auth/connection'
import { clearSessionCookie, setSessionCookie } from '../auth/session-middleware'
import type { AppContext } from '../context'
import { AppError } from '../errors'
import { changeOwnPassword } from '../use-cases/session/change-own-password'
import { describeMe } from '../use-cases/session/describe-me'
import { signIn } from '../use-cases/session/sign-in'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'

export function sessionRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.post('/session', 'anyone', async (request, response) => {
    const input = parseInput(signInSchema, request.body)
    const plainConnection = isPlainConnection(request, context.env)
    const { personId, token } = await signIn(context, input, {
      address: addressKey(request.ip),
      plainConnection,
    })
    if (request.sessionToken) await context.auth.lucia.invalidateSession(request.sessionToken)
    setSessionCookie(context, request.secure, response, token)
    response.json(describeMe(context, { id: personId }, plainConnection))
  })

  api.get('/session', 'signedIn', (request, response) => {
    response.json(describeMe(context, requireActor(request), isPlainConnection(request, context.env)))
  })

  api.delete('/session', 'signedIn', async (request, response) => {
    await context.auth.lucia.invalidateSession(requireToken(request))
    clearSessionCookie(context, request.secure, response)
    response.status(204).end()
  })

  api.put('/session/password', 'signedIn', async (request, response) => {
    const input = parseInput(ownPasswordChangeSchema, request.body)
    const session = { token: requireToken(request), address: addressKey(request.ip) }
    await changeOwnPassword(context, requireActor(request), input, session)
    response.status(204).end()
  })

  return api
}

function requireToken(request: Pick<Request, 'sessionToken'>): string {
  if (!request.sessionToken) throw new AppError('notSignedIn')
  return request.sessionToken
}
