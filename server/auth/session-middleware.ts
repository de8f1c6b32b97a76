import type { RequestHandler, Response } from 'express'
import type { AppContext } from '../context'
import { readSettings } from '../db/settings'
import { findActor } from './auth'
import { isPlainConnection } from './connection'

/** Finds who is asking by the session cookie and puts them on the request. */
export function readSession(context: AppContext): RequestHandler {
  return async (request, response, next) => {
    const token = context.auth.lucia.readSessionCookie(request.headers.cookie ?? '')
    if (token && mayTravel(context, request)) {
      const found = await findActor(context.auth, context.db, token)
      if (found) {
        request.actor = found.actor
        request.sessionToken = token
        if (found.extended) setSessionCookie(context, request.secure, response, token)
      }
    }
    next()
  }
}

/** A session begun while plain networks were allowed stops working over one when they no longer are. */
function mayTravel(context: AppContext, request: Parameters<RequestHandler>[0]): boolean {
  return !isPlainConnection(request, context.env) || readSettings(context.db).allowPlainNetwork
}

export function setSessionCookie(
  context: AppContext,
  secure: boolean,
  response: Response,
  token: string,
): void {
  const cookie = context.auth.lucia.createSessionCookie(token)
  cookie.attributes.secure = secure
  response.append('Set-Cookie', cookie.serialize())
}

export function clearSessionCookie(context: AppContext, secure: boolean, response: Response): void {
  const cookie = context.auth.lucia.createBlankSessionCookie()
  cookie.attributes.secure = secure
  response.append('Set-Cookie', cookie.serialize())
}
