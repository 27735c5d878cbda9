import type { Request, RequestHandler } from 'express'
import type { AppContext } from '#server/context.ts'
import { forbidden, signedOut } from '#server/http/errors.ts'
import { clearSessionCookie, readSessionCookie, setSessionCookie } from '#server/http/session-cookie.ts'
import { createSessions, type SignedIn } from '#server/identity/sessions.ts'
import { policy, type Action } from '#server/policy.ts'
import { roleIncludes } from '#shared/roles.ts'

declare global {
  // Express's own way of telling what middleware adds to a request.
  // eslint-disable-next-line @typescript-eslint/no-namespace
  namespace Express {
    interface Request {
      signedIn?: SignedIn
    }
  }
}

/**
 * Lets signed-in people through: the cookie's token must be ours, its session row valid and its person active, at
 * every request. A token that has run out is renewed while the row is valid. 401 `signed-out` otherwise.
 */
export function authenticate(context: AppContext): RequestHandler {
  const sessions = createSessions(context)
  return async (request, response, next) => {
    const token = readSessionCookie(request)
    if (token === undefined) throw signedOut()
    const found = await sessions.resume(token, request.ip)
    if (!found) {
      clearSessionCookie(response, context.config)
      throw signedOut()
    }
    if (found.renewedToken !== null) setSessionCookie(response, context.config, found.renewedToken)
    request.signedIn = found.signedIn
    next()
  }
}

/** Who sends this request; only behind `authenticate`. */
export function signedIn(request: Request): SignedIn {
  if (!request.signedIn) throw signedOut()
  return request.signedIn
}

/** Lets through whoever the policy table allows `action`; 403 `forbidden` otherwise. */
export function authorise(action: Action): RequestHandler {
  return (request, _response, next) => {
    if (!roleIncludes(signedIn(request).person.role, policy[action])) throw forbidden()
    next()
  }
}
