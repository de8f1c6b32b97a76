import { newPieceSchema } from '@shared/schemas/parts'
import { pieceListQuerySchema } from '@shared/schemas/pieces'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { addPiece } from '../use-cases/pieces/add-piece'
import { exportPieces } from '../use-cases/pieces/export-pieces'
import { listPieces } from '../use-cases/pieces/list-pieces'
import { showPiece } from '../use-cases/pieces/show-piece'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'
import { sendCsv } from './send-csv'

export function piecesRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/pieces', 'shop:read', (request, response) => {
    response.json(listPieces(context, parseInput(pieceListQuerySchema, request.query)))
  })

  api.get('/pieces.csv', 'shop:read', (request, response) => {
    sendCsv(response, 'pieces', exportPieces(context, parseInput(pieceListQuerySchema, request.query)))
  })

  api.post('/pieces', 'piece:create', (request, response) => {
    const input = parseInput(newPieceSchema, request.body)
    response.status(201).json(addPiece(context, requireActor(request), input))
  })

  api.get('/pieces/:id', 'shop:read', (request, response) => {
    response.json(showPiece(context, request.params.id))
  })

  return api
}
