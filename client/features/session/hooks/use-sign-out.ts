import { useMutation } from '@tanstack/react-query'
import { useNavigate } from 'react-router-dom'
import { useStatus } from '#client/components/ui/status.tsx'
import { api, ApiError, keepSession } from '#client/lib/api.ts'
import { problemSentence } from '#client/lib/form-problem.ts'

/**
 * Ends this browser's session, or every session of the person. The guard lets nobody back from here on; the sign-in page
 * then empties the cache.
 */
export function useSignOut() {
  const navigate = useNavigate()
  const say = useStatus()
  return useMutation({
    mutationFn: async (where: 'here' | 'everywhere') => {
      try {
        await api.delete(where === 'here' ? '/session' : '/sessions')
      } catch (error) {
        // The session had ended already: that is what was asked for.
        if (!(error instanceof ApiError) || error.problem.code !== 'signed-out') throw error
      }
    },
    onSuccess: async (_, where) => {
      keepSession(null)
      await navigate('/sign-in')
      say(where === 'here' ? 'Signed out.' : 'Signed out everywhere.')
    },
    onError: (error) => say(`Not signed out: ${problemSentence(error)}`),
  })
}
