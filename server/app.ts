import express, { type Express } from 'express'
import { requireSameOrigin } from './auth/same-origin'
import { readSession } from './auth/session-middleware'
import type { AppContext } from './context'
import { answerErrors, answerUnknownPath } from './middleware/answer-errors'
import { logRequests } from './middleware/log-requests'
import { securityHeaders } from './middleware/security-headers'
import { apiRouters } from './routes/all'
import type { ApiRoute } from './routes/api-router'

export interface App {
  express: Express
  /** Every API route with what it asks for. */
  routes: readonly ApiRoute[]
}

const jsonLimit = '8mb'

/** The whole web side without a listening socket. What serves the screens is put on by `mountScreens`. */
export function createApp(context: AppContext): App {
  const app = express()
  app.disable('x-powered-by')
  // Only a proxy on this machine or on the shop's own network is believed about who is calling.
  app.set('trust proxy', context.env.tls === 'proxy' ? ['loopback', 'linklocal', 'uniquelocal'] : false)
  app.use(logRequests(context.logger), securityHeaders(context.env))

  const routers = apiRouters(context)
  app.use('/api', requireSameOrigin, express.json({ limit: jsonLimit }), readSession(context))
  app.use('/api', noStore)
  for (const { router } of routers) app.use('/api', router)
  app.use('/api', answerUnknownPath)
  app.use(answerErrors(context.logger))
  return { express: app, routes: routers.flatMap((router) => router.routes) }
}

/** Answers may hold a shop's figures: no cache between keeps them. Pictures set their own header. */
const noStore: express.RequestHandler = (_request, response, next) => {
  response.set('Cache-Control', 'no-store')
  next()
}
