import { newEquipmentSchema } from '@shared/schemas/equipment'
import { z } from 'zod'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { addEquipment } from '../use-cases/equipment/add-equipment'
import { changeEquipment } from '../use-cases/equipment/change-equipment'
import { listEquipment } from '../use-cases/equipment/list-equipment'
import { ApiRouter } from './api-router'
import { parseChange, parseInput } from './parse'

const equipmentListQuerySchema = z.object({
  kind: z.enum(['lightSource', 'referenceFlat', 'cameraSetUp', 'thermometer']).optional(),
})

export function equipmentRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/equipment', 'shop:read', (request, response) => {
    const { kind } = parseInput(equipmentListQuerySchema, request.query)
    response.json({ rows: listEquipment(context, kind) })
  })

  api.post('/equipment', 'equipment:edit', (request, response) => {
    const input = parseInput(newEquipmentSchema, request.body)
    response.status(201).json(addEquipment(context, requireActor(request), input))
  })

  api.patch('/equipment/:id', 'equipment:edit', (request, response) => {
    const change = parseChange(newEquipmentSchema, request.body)
    response.json(changeEquipment(context, requireActor(request), request.params.id, change))
  })

  return api
}
