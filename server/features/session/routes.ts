import { Router } from 'express'
import type { AppContext } from '#server/context.ts'
import { presentSession } from '#server/features/session/present.ts'
import { sessionUseCases } from '#server/features/session/use-cases.ts'
import { authorise, signedIn } from '#server/http/authenticate.ts'
import { readBody } from '#server/http/input.ts'
import { limitSignIns } from '#server/http/rate-limit.ts'
import { clearSessionCookie, setSessionCookie } from '#server/http/session-cookie.ts'
import { signInSchema } from '#shared/schemas/account.ts'

/** Signing in: the only change that somebody unknown may ask for. */
export function signInRouter(context: AppContext): Router {
  const { config } = context
  const { signIn } = sessionUseCases(context)
  const router = Router()
  router.post('/', limitSignIns(config), async (request, response) => {
    const origin = { address: request.ip, userAgent: request.get('User-Agent') ?? '' }
    const { person, token, csrfToken } = await signIn(readBody(request, signInSchema), origin)
    setSessionCookie(response, config, token)
    response.json(presentSession(person, csrfToken, config.mode))
  })
  return router
}

/** The session one is in: who, and its end. */
export function sessionRouter(context: AppContext): Router {
  const { config } = context
  const { signOut } = sessionUseCases(context)
  const router = Router()
  router.get('/', authorise('session.read'), (request, response) => {
    const { person, csrfToken } = signedIn(request)
    response.json(presentSession(person, csrfToken, config.mode))
  })
  router.delete('/', authorise('session.end'), async (request, response) => {
    await signOut(signedIn(request))
    clearSessionCookie(response, config)
    response.status(204).end()
  })
  return router
}

/** All of a person's sessions: signing out everywhere. */
export function sessionsRouter(context: AppContext): Router {
  const { signOutEverywhere } = sessionUseCases(context)
  const router = Router()
  router.delete('/', authorise('session.end'), async (request, response) => {
    await signOutEverywhere(signedIn(request))
    clearSessionCookie(response, context.config)
    response.status(204).end()
  })
  return router
}
