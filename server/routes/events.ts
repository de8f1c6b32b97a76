import { eventListQuerySchema } from '@shared/schemas/events'
import type { AppContext } from '../context'
import { listEvents } from '../use-cases/events/list-events'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'

export function eventsRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/events', 'event:read', (request, response) => {
    response.json(listEvents(context, parseInput(eventListQuerySchema, request.query)))
  })

  return api
}
