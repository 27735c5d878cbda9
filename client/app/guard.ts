/** Sends strangers to the sign-in page before any loader of a guarded page runs. */
import type { QueryClient } from '@tanstack/react-query'
import { redirect, type MiddlewareFunction } from 'react-router-dom'
import { ApiError, sessionIsKept } from '#client/lib/api.ts'
import { signInPath } from '#client/lib/next-path.ts'
import { sessionQueries } from '#client/lib/session.ts'

/**
 * Middleware of the guarded part. The session is in the cache once it has let someone through; after signing out it may
 * still be there for a moment, and counts no more.
 */
export function requireSession(queryClient: QueryClient): MiddlewareFunction {
  return async ({ request }) => {
    const { pathname, search } = new URL(request.url)
    const toSignIn = () => redirect(signInPath(`${pathname}${search}`))
    const current = sessionQueries.current()
    if (queryClient.getQueryData(current.queryKey) && !sessionIsKept()) throw toSignIn()
    try {
      await queryClient.ensureQueryData(current)
    } catch (error) {
      if (!(error instanceof ApiError) || error.problem.code !== 'signed-out') throw error
      throw toSignIn()
    }
  }
}
