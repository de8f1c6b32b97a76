import type { Request } from 'express'
import type { Env } from '../env'

type Caller = Pick<Request, 'secure' | 'ip' | 'headers'>

/** Loopback of IPv4, IPv6, and IPv4 seen through IPv6. */
function isLoopback(address: string | undefined): boolean {
  if (!address) return false
  const plain = address.replace(/^::ffff:/, '')
  return plain === '::1' || /^127\.\d+\.\d+\.\d+$/.test(plain)
}

/**
 * Whether passwords and cookies of this request travel where others can read them: no TLS, and not within
 * this machine. Behind a proxy that nobody told us of every request seems to come from this machine, so a
 * forwarded one counts as from outside.
 */
export function isPlainConnection(request: Caller, env: Pick<Env, 'tls'>): boolean {
  if (request.secure) return false
  const forwardedUnasked = env.tls === 'off' && hasForwardedHeader(request)
  return forwardedUnasked || !isLoopback(request.ip)
}

function hasForwardedHeader(request: Caller): boolean {
  return request.headers['x-forwarded-for'] !== undefined || request.headers.forwarded !== undefined
}
