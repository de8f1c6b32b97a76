import { randomUUID } from 'node:crypto'
import type { Request, Response } from 'express'
import { pinoHttp } from 'pino-http'
import type { Logger } from '../logger'

/** One line a request: method, path, status and time. No headers, queries or bodies, where secrets could be. */
export function logRequests(logger: Logger) {
  return pinoHttp<Request, Response>({
    logger,
    genReqId: () => randomUUID(),
    wrapSerializers: false,
    serializers: {
      req: (request: Request) => ({ id: request.id, method: request.method, path: pathOf(request) }),
      res: (response: Response) => ({ status: response.statusCode }),
    },
    customLogLevel: (_request, response, error) => {
      if (error || response.statusCode >= 500) return 'error'
      return response.statusCode >= 400 ? 'info' : 'debug'
    },
  })
}

function pathOf(request: Request): string {
  return request.originalUrl.split('?', 1)[0]
}
