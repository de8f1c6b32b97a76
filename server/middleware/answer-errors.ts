import type { ErrorRequestHandler, RequestHandler } from 'express'
import { AppError } from '../errors'
import type { Logger } from '../logger'

export const answerUnknownPath: RequestHandler = () => {
  throw new AppError('notFound')
}

/** Turns whatever was thrown into the one shape of answer. */
export function answerErrors(logger: Logger): ErrorRequestHandler {
  return (thrown, request, response, next) => {
    const error = asAppError(thrown)
    if (error.status >= 500) logger.error({ err: thrown, requestId: request.id }, 'a request failed')
    else logger.debug({ code: error.code, requestId: request.id }, error.message)
    if (response.headersSent) return next(thrown)
    if (error.options.retryAfterS !== undefined) response.set('Retry-After', `${error.options.retryAfterS}`)
    response.set('Cache-Control', 'no-store').status(error.status).json(error.toBody())
  }
}

function asAppError(thrown: unknown): AppError {
  if (thrown instanceof AppError) return thrown
  if (!isCallersFault(thrown)) return new AppError('internal')
  switch (thrown.status) {
    case 404:
      return new AppError('notFound', { log: thrown.message })
    case 413:
      return new AppError('tooLarge', { say: { key: 'body.tooLarge' }, log: thrown.message })
    default:
      return new AppError('invalidInput', { say: { key: 'body.invalidInput' }, log: thrown.message })
  }
}

/** What Express itself refuses: bad JSON, a body too large, a path that can't be decoded, a file that isn't there. */
function isCallersFault(thrown: unknown): thrown is Error & { status: number } {
  if (!(thrown instanceof Error) || !('status' in thrown) || typeof thrown.status !== 'number') return false
  return thrown.status >= 400 && thrown.status < 500
}
