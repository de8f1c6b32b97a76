import type { RequestHandler } from 'express'
import helmet from 'helmet'
import type { Env } from '../env'

/** helmet with a policy of content that lets only our own code run. */
export function securityHeaders(env: Pick<Env, 'tls' | 'nodeEnv'>): RequestHandler {
  const developing = env.nodeEnv === 'development'
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        baseUri: ["'none'"],
        objectSrc: ["'none'"],
        frameAncestors: ["'none'"],
        formAction: ["'self'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'", 'data:'],
        // radix-ui puts style elements and attributes into the page.
        styleSrc: ["'self'", "'unsafe-inline'"],
        workerSrc: ["'self'", 'blob:'],
        // vite's development page has an inline script and speaks to its own socket.
        scriptSrc: developing ? ["'self'", "'unsafe-inline'"] : ["'self'"],
        connectSrc: developing ? ["'self'", 'ws:'] : ["'self'"],
      },
    },
    strictTransportSecurity:
      env.tls === 'off' ? false : { maxAge: 180 * 24 * 3600, includeSubDomains: false },
    referrerPolicy: { policy: 'same-origin' },
  })
}
