import { useMutation, useQueryClient } from '@tanstack/react-query'
import { api, keepSession } from '#client/lib/api.ts'
import { sessionQueries } from '#client/lib/session.ts'
import type { Session, SignIn } from '#shared/schemas/account.ts'

/** Signs in and puts the session into the cache. */
export function useSignIn() {
  const queryClient = useQueryClient()
  return useMutation({
    mutationFn: (body: SignIn) => api.post<Session>('/session', body),
    onSuccess: (session) => {
      keepSession(session)
      queryClient.setQueryData(sessionQueries.current().queryKey, session)
    },
  })
}
