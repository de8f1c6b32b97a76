import { may, type Permission } from '@shared/access/permissions'
import { type RequestHandler, Router } from 'express'
import type { RouteParameters } from 'express-serve-static-core'
import { requireActor } from '../auth/actor'
import { AppError } from '../errors'

/** What a route asks of whoever calls it: nothing, a signed-in person, or a permission of `shared/access`. */
export type Need = 'anyone' | 'signedIn' | Permission
export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

export interface ApiRoute {
  method: Method
  /** Below `/api`. */
  path: string
  needs: Need
}

/**
 * A router on which no route can be declared without saying who may call it. `routes` lists them all, so
 * that a test can walk them.
 */
export class ApiRouter {
  readonly router = Router()
  readonly routes: ApiRoute[] = []

  get = this.#declare('get')
  post = this.#declare('post')
  put = this.#declare('put')
  patch = this.#declare('patch')
  delete = this.#declare('delete')

  #declare(method: Method) {
    return <Path extends string>(
      path: Path,
      needs: Need,
      ...handlers: RequestHandler<RouteParameters<Path>>[]
    ): void => {
      this.routes.push({ method, path, needs })
      this.router[method](path as string, guard(needs), ...(handlers as RequestHandler[]))
    }
  }
}

function guard(needs: Need): RequestHandler {
  return (request, _response, next) => {
    if (needs !== 'anyone') requireNeed(needs, requireActor(request).roles)
    next()
  }
}

function requireNeed(needs: Exclude<Need, 'anyone'>, roles: Parameters<typeof may>[0]): void {
  if (needs !== 'signedIn' && !may(roles, needs)) throw new AppError('notAllowed')
}
