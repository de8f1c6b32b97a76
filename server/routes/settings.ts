import { settingsSchema } from '@shared/schemas/settings'
import { requireActor } from '../auth/actor'
import type { AppContext } from '../context'
import { changeSettings } from '../use-cases/settings/change-settings'
import { showSettings } from '../use-cases/settings/show-settings'
import { ApiRouter } from './api-router'
import { parseChange } from './parse'

export function settingsRouter(context: AppContext): ApiRouter {
  const api = new ApiRouter()

  api.get('/settings', 'shop:read', (_request, response) => {
    response.json(showSettings(context))
  })

  api.patch('/settings', 'settings:edit', (request, response) => {
    const change = parseChange(settingsSchema, request.body)
    response.json(changeSettings(context, requireActor(request), change))
  })

  return api
}
