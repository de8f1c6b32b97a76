import { searchQuerySchema } from '@shared/schemas/search'
import type { AppContext } from '../context'
import { searchShop } from '../use-cases/search/search-shop'
import { ApiRouter } from './api-router'
import { parseInput } from './parse'

export function searchRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/search', 'shop:read', (request, response) => {
    const { q } = parseInput(searchQuerySchema, request.query)
    response.json(searchShop(context, q))
  })

  return api
}
