/** Sends strangers to the sign-in page before any loader of a guarded page runs. */
import type { QueryClient } from '@tanstack/react-query'
import { redirect, type MiddlewareFunction } from 'react-router-dom'
import { ApiError } from '#client/lib/api.ts'
import { signInPath } from '#client/lib/next-path.ts'
import { sessionQueries } from '#client/lib/session.ts'

/** Middleware of the guarded part. The session is in the cache once it has let someone through. */
export function requireSession(queryClient: QueryClient): MiddlewareFunction {
  return async ({ request }) => {
    try {
      await queryClient.ensureQueryData(sessionQueries.current())
    } catch (error) {
      if (!(error instanceof ApiError) || error.problem.code !== 'signed-out') throw error
      const { pathname, search } = new URL(request.url)
      throw redirect(signInPath(`${pathname}${search}`))
    }
  }
}
