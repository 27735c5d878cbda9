/** Who is signed in, as every feature may ask it. Signing in and out itself is features/session. */
import { queryOptions, useSuspenseQuery } from '@tanstack/react-query'
import { api, keepSession } from '#client/lib/api.ts'
import { roleIncludes, type Role } from '#shared/roles.ts'
import type { Session } from '#shared/schemas/account.ts'

export const sessionQueries = {
  /** Throws an ApiError with code `signed-out` for a stranger. */
  current: () =>
    queryOptions({
      queryKey: ['session'],
      queryFn: async ({ signal }) => {
        const session = await api.get<Session>('/session', { signal })
        keepSession(session)
        return session
      },
      staleTime: Infinity,
      gcTime: Infinity,
    }),
}

/** The session; only for pages behind the sign-in, whose guard has put it into the cache. */
export function useSession(): Session {
  return useSuspenseQuery(sessionQueries.current()).data
}

/** Whether the person may do what needs `role`. The server decides; this hides what it would refuse. */
export function useIncludesRole(role: Role): boolean {
  return roleIncludes(useSession().person.role, role)
}
