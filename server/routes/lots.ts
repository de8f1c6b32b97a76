import { newLotSchema } from '@shared/schemas/parts'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { addLot } from '../use-cases/lots/add-lot'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'

export function lotsRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.post('/lots', 'piece:create', (request, response) => {
    const input = parseInput(newLotSchema, request.body)
    response.status(201).json(addLot(context, requireActor(request), input))
  })

  return api
}
