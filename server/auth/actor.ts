import type { Role } from '@shared/access/permissions'
import type { Request } from 'express'
import { AppError } from '../errors'

/** Who is asking. */
export interface Actor {
  id: string
  name: string
  roles: readonly Role[]
}

declare global {
  namespace Express {
    interface Request {
      actor?: Actor
      /** What the session cookie carries; only `server/auth` and signing out have a use for it. */
      sessionToken?: string
    }
  }
}

/** The person asking; for routes that were declared with a permission there always is one. */
export function requireActor(request: Pick<Request, 'actor'>): Actor {
  if (!request.actor) throw new AppError('notSignedIn')
  return request.actor
}
