/** The cache of server state. */
import { QueryClient } from '@tanstack/react-query'
import { ApiError } from '#client/lib/api.ts'

const tries = 2

/** A refusal (4xx) stays a refusal; silence and server trouble get two more tries. */
export function shouldRetry(failures: number, error: Error): boolean {
  if (error instanceof ApiError && error.problem.status < 500) return false
  return failures < tries
}

/** `always`: a server on this machine answers without a network, so the browser's own idea of "online" is no guide. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { retry: shouldRetry, staleTime: 10_000, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  })
}

/** The application's own; loaders use it, tests create theirs. */
export const queryClient = createQueryClient()
