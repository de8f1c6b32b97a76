import {
  newReadingSchema,
  readingChangeSchema,
  readingListQuerySchema,
  saveMarksSchema,
} from '@shared/schemas/readings'
import { sendReadingSchema } from '@shared/schemas/reviews'
import { z } from 'zod'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { drawMap } from '../storage/map-picture'
import { changeReading } from '../use-cases/readings/change-reading'
import { exportReadings } from '../use-cases/readings/export-readings'
import { listReadings } from '../use-cases/readings/list-readings'
import { reopenReading } from '../use-cases/readings/reopen-reading'
import { saveMarks } from '../use-cases/readings/save-marks'
import { sendReading } from '../use-cases/readings/send-reading'
import { showReading } from '../use-cases/readings/show-reading'
import { startReading } from '../use-cases/readings/start-reading'
import { computeResult } from '../use-cases/results/compute-result'
import { findMap } from '../use-cases/results/find-map'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'
import { sendCsv } from './send-csv'

const mapQuerySchema = z.object({ size: z.coerce.number().int().min(16).max(1024).default(256) })

export function readingsRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/readings', 'shop:read', (request, response) => {
    const query = parseInput(readingListQuerySchema, request.query)
    response.json(listReadings(context, requireActor(request), query))
  })

  api.get('/readings.csv', 'shop:read', (request, response) => {
    const query = parseInput(readingListQuerySchema, request.query)
    sendCsv(response, 'readings', exportReadings(context, requireActor(request), query))
  })

  api.post('/readings', 'reading:create', (request, response) => {
    const input = parseInput(newReadingSchema, request.body)
    response.status(201).json(startReading(context, requireActor(request), input))
  })

  api.get('/readings/:id', 'shop:read', (request, response) => {
    response.json(showReading(context, requireActor(request), request.params.id))
  })

  api.patch('/readings/:id', 'reading:edit-own', (request, response) => {
    const change = parseInput(readingChangeSchema, request.body)
    response.json(changeReading(context, requireActor(request), request.params.id, change))
  })

  api.put('/readings/:id/marks', 'reading:edit-own', (request, response) => {
    const input = parseInput(saveMarksSchema, request.body)
    response.json(saveMarks(context, requireActor(request), request.params.id, input))
  })

  api.post('/readings/:id/compute', 'reading:edit-own', async (request, response) => {
    response.json(await computeResult(context, requireActor(request), request.params.id))
  })

  api.post('/readings/:id/send', 'reading:send-own', (request, response) => {
    const input = parseInput(sendReadingSchema, request.body)
    response.json(sendReading(context, requireActor(request), request.params.id, input))
  })

  api.post('/readings/:id/reopen', 'reading:send-own', (request, response) => {
    response.json(reopenReading(context, requireActor(request), request.params.id))
  })

  api.get('/readings/:id/map.png', 'shop:read', async (request, response) => {
    const { size } = parseInput(mapQuerySchema, request.query)
    const { resultId, map } = findMap(context, request.params.id)
    // A later result is another picture at the same address, so the browser asks each time.
    response.set('Cache-Control', 'private, no-cache').set('ETag', `"${resultId}-${size}"`)
    if (request.fresh) return void response.status(304).end()
    response.type('png').send(await drawMap(map, size))
  })

  return api
}
