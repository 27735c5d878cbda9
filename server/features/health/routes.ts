import { Router } from 'express'
import type { AppContext } from '#server/context.ts'
import { HttpError } from '#server/http/errors.ts'
import { version } from '#server/root.ts'
import type { Health } from '#shared/schemas/health.ts'

/** Whether the server and its database answer, and what kind of installation this is. Public. */
export function healthRouter({ config, database, log }: AppContext): Router {
  const router = Router()
  router.get('/', async (_request, response) => {
    try {
      await database.ping()
    } catch (error) {
      log.error({ err: error }, 'the database does not answer')
      throw new HttpError(503, 'database', 'The database does not answer.')
    }
    const health: Health = { status: 'ok', version, database: 'ok', mode: config.mode }
    response.json(health)
  })
  return router
}
