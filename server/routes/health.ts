import { sql } from 'drizzle-orm'
import type { AppContext } from '../context'
import { ApiRouter } from './api-router'

export function healthRouter({ db }: AppContext): ApiRouter {
  const api = new ApiRouter()

  /** Says that the server answers and that its database does. */
  api.get('/health', 'anyone', (_request, response) => {
    db.get(sql`SELECT 1`)
    response.json({ status: 'ok' })
  })

  return api
}
