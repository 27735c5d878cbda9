import compression from 'compression'
import cookieParser from 'cookie-parser'
import express, { Router, type Express } from 'express'
import type { AppContext } from '#server/context.ts'
import { accountRouter } from '#server/features/account/routes.ts'
import { designsRouter } from '#server/features/designs/routes.ts'
import { healthRouter } from '#server/features/health/routes.ts'
import { projectsRouter } from '#server/features/projects/routes.ts'
import { runsRouter } from '#server/features/runs/routes.ts'
import { sessionRouters } from '#server/features/session/routes.ts'
import { authenticate } from '#server/http/authenticate.ts'
import { clientFiles } from '#server/http/client-files.ts'
import { requireCsrfToken, sameOriginOnly } from '#server/http/csrf.ts'
import { errorHandler, unknownPath } from '#server/http/error-handler.ts'
import { jsonOnly, loopbackHostOnly, noStore, securityHeaders } from '#server/http/guards.ts'
import { limitRequests } from '#server/http/rate-limit.ts'
import { requestLog } from '#server/http/request-log.ts'
import { limits } from '#shared/limits.ts'

/** The whole HTTP application, without a port: the API under /api, the client everywhere else. */
export function createApp(context: AppContext): Express {
  const { config, log } = context
  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', config.trustProxy)
  app.use(requestLog(log), securityHeaders(config))
  if (config.mode === 'demo') app.use(loopbackHostOnly)
  app.use(compression())
  app.use('/api', apiRouter(context))
  app.use(clientFiles(config.clientDirectory))
  app.use(errorHandler(log))
  return app
}

/** Everything under /api. What stands before `authenticate` is open to strangers. */
function apiRouter(context: AppContext): Router {
  const api = Router()
  api.use(limitRequests(context.config), noStore, sameOriginOnly, jsonOnly)
  api.use(express.json({ limit: limits.requestBody }), cookieParser())

  api.use('/health', healthRouter(context))
  const { signIn, session, sessions } = sessionRouters(context)
  api.use('/session', signIn)

  const signedInOnly = [authenticate(context), requireCsrfToken]
  api.use('/session', signedInOnly, session)
  api.use('/sessions', signedInOnly, sessions)
  api.use('/account', signedInOnly, accountRouter(context))
  api.use('/projects', signedInOnly, projectsRouter(context))
  api.use('/designs', signedInOnly, designsRouter(context))
  api.use('/runs', signedInOnly, runsRouter(context))

  api.use(unknownPath)
  return api
}
