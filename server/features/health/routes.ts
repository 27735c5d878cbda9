import { Router } from 'express'
import type { AppContext } from '#server/context.ts'
import { HttpError } from '#server/http/errors.ts'
import { version } from '#server/root.ts'

/** Whether the server and its database answer. Public. */
export function healthRouter({ database, log }: AppContext): Router {
  const router = Router()
  router.get('/', async (_request, response) => {
    try {
      await database.ping()
    } catch (error) {
      log.error({ err: error }, 'the database does not answer')
      throw new HttpError(503, 'database', 'The database does not answer.')
    }
    response.json({ status: 'ok', version, database: 'ok' })
  })
  return router
}
