import { newFaceSchema, newPartSchema } from '@shared/schemas/parts'
import { z } from 'zod'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { addFace } from '../use-cases/faces/add-face'
import { changeFace } from '../use-cases/faces/change-face'
import { addPart } from '../use-cases/parts/add-part'
import { changePart } from '../use-cases/parts/change-part'
import { listParts } from '../use-cases/parts/list-parts'
import { showPart } from '../use-cases/parts/show-part'
import { ApiRouter } from './api-router'
import { parseChange, parseInput } from './parse'

const partListQuerySchema = z.object({ search: z.string().max(100).optional() })

export function partsRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/parts', 'shop:read', (request, response) => {
    const { search } = parseInput(partListQuerySchema, request.query)
    response.json({ rows: listParts(context, search) })
  })

  api.post('/parts', 'part:edit', (request, response) => {
    const input = parseInput(newPartSchema, request.body)
    response.status(201).json(addPart(context, requireActor(request), input))
  })

  api.get('/parts/:id', 'shop:read', (request, response) => {
    response.json(showPart(context, request.params.id))
  })

  api.patch('/parts/:id', 'part:edit', (request, response) => {
    const change = parseChange(newPartSchema, request.body)
    response.json(changePart(context, requireActor(request), request.params.id, change))
  })

  api.post('/parts/:id/faces', 'part:edit', (request, response) => {
    const input = parseInput(newFaceSchema, request.body)
    response.status(201).json(addFace(context, requireActor(request), request.params.id, input))
  })

  api.patch('/faces/:id', 'part:edit', (request, response) => {
    const change = parseChange(newFaceSchema, request.body)
    response.json(changeFace(context, requireActor(request), request.params.id, change))
  })

  return api
}
