import type { RequestHandler } from 'express'
import { AppError } from '../errors'

const readOnlyMethods = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses a change that a page of another site sent with our cookie. Browsers say `Sec-Fetch-Site` on
 * https and on localhost, and `Origin` with every change everywhere; a change with neither is refused too.
 */
export const requireSameOrigin: RequestHandler = (request, _response, next) => {
  if (!readOnlyMethods.has(request.method) && !isSameOrigin(request)) throw new AppError('crossOrigin')
  next()
}

function isSameOrigin(request: Parameters<RequestHandler>[0]): boolean {
  const site = request.get('sec-fetch-site')
  if (site !== undefined) return site === 'same-origin'
  return request.get('origin') === `${request.protocol}://${request.host}`
}
