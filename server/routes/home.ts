import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { showHome } from '../use-cases/home/show-home'
import { ApiRouter } from './api-router'

export function homeRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/home', 'shop:read', (request, response) => {
    response.json(showHome(context, requireActor(request)))
  })

  return api
}
