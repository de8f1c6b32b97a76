import {
  newDispositionSchema,
  newRemarkSchema,
  remarkAnswerSchema,
  sendBackSchema,
  setAsideSchema,
} from '@shared/schemas/reviews'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { decideDisposition } from '../use-cases/dispositions/decide-disposition'
import { addRemark } from '../use-cases/reviews/add-remark'
import { agreeReading } from '../use-cases/reviews/agree-reading'
import { answerRemark } from '../use-cases/reviews/answer-remark'
import { closeRemark } from '../use-cases/reviews/close-remark'
import { sendBackReading } from '../use-cases/reviews/send-back-reading'
import { setAsideReading } from '../use-cases/reviews/set-aside-reading'
import { showReview } from '../use-cases/reviews/show-review'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'

export function reviewsRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/readings/:id/review', 'shop:read', (request, response) => {
    response.json(showReview(context, requireActor(request), request.params.id))
  })

  api.post('/readings/:id/agree', 'reading:review', (request, response) => {
    response.json(agreeReading(context, requireActor(request), request.params.id))
  })

  api.post('/readings/:id/send-back', 'reading:review', (request, response) => {
    const { reason } = parseInput(sendBackSchema, request.body)
    response.json(sendBackReading(context, requireActor(request), request.params.id, reason))
  })

  api.post('/readings/:id/set-aside', 'reading:set-aside', (request, response) => {
    const { cause } = parseInput(setAsideSchema, request.body)
    response.json(setAsideReading(context, requireActor(request), request.params.id, cause))
  })

  api.post('/readings/:id/remarks', 'reading:review', (request, response) => {
    const remark = parseInput(newRemarkSchema, request.body)
    response.status(201).json({ rows: addRemark(context, requireActor(request), request.params.id, remark) })
  })

  api.post('/remarks/:id/answers', 'remark:answer', (request, response) => {
    const { text } = parseInput(remarkAnswerSchema, request.body)
    response.status(201).json({ rows: answerRemark(context, requireActor(request), request.params.id, text) })
  })

  api.post('/remarks/:id/close', 'reading:review', (request, response) => {
    response.json({ rows: closeRemark(context, requireActor(request), request.params.id) })
  })

  api.post('/pieces/:id/dispositions', 'piece:dispose', (request, response) => {
    const input = parseInput(newDispositionSchema, request.body)
    response
      .status(201)
      .json({ rows: decideDisposition(context, requireActor(request), request.params.id, input) })
  })

  return api
}
