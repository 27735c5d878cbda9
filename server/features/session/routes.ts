import { Router } from 'express'
import type { AppContext } from '#server/context.ts'
import { presentSession } from '#server/features/session/present.ts'
import { sessionUseCases } from '#server/features/session/use-cases.ts'
import { authorise, signedIn } from '#server/http/authenticate.ts'
import { readBody } from '#server/http/input.ts'
import { limitSignIns } from '#server/http/rate-limit.ts'
import { clearSessionCookie, setSessionCookie } from '#server/http/session-cookie.ts'
import { signInSchema } from '#shared/schemas/account.ts'

type UseCases = ReturnType<typeof sessionUseCases>

/** The three routers around sign-ins, on one set of use cases: `signIn` alone is for strangers. */
export function sessionRouters(context: AppContext): Record<'signIn' | 'session' | 'sessions', Router> {
  const useCases = sessionUseCases(context)
  return {
    signIn: signInRouter(context, useCases),
    session: sessionRouter(context, useCases),
    sessions: sessionsRouter(context, useCases),
  }
}

/** Signing in: the only change that somebody unknown may ask for. */
function signInRouter({ config }: AppContext, { signIn }: UseCases): Router {
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
function sessionRouter({ config }: AppContext, { signOut }: UseCases): Router {
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
function sessionsRouter({ config }: AppContext, { signOutEverywhere }: UseCases): Router {
  const router = Router()
  router.delete('/', authorise('session.end'), async (request, response) => {
    await signOutEverywhere(signedIn(request))
    clearSessionCookie(response, config)
    response.status(204).end()
  })
  return router
}
