import type { ReactNode } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { ApiError, OfflineError } from '#client/lib/api.ts'
import { problemSentence } from '#client/lib/form-problem.ts'

/** Headline for a failure of a whole page or list. */
function headline(error: unknown): string {
  if (error instanceof OfflineError) return 'The server does not answer'
  if (!(error instanceof ApiError)) return 'This part of the page failed'
  const { status } = error.problem
  if (status === 404) return 'Not found'
  if (status === 403) return 'Not permitted'
  if (status === 401) return 'Signed out'
  return 'The server could not do that'
}

export interface ErrorStateProps {
  error: unknown
  /** Offered as "Try again", unless the thing is known not to be there. */
  retry?: () => void
  /** A way on, such as to the list. */
  action?: ReactNode
}

/** A page or list that could not be had: what happened, and what to do. */
export function ErrorState({ error, retry, action }: ErrorStateProps) {
  const missing = error instanceof ApiError && error.problem.status === 404
  return (
    <div role="alert" className="flex flex-col items-center gap-2 px-6 py-12 text-center">
      <p className="text-lg font-medium">{headline(error)}</p>
      <p className="max-w-prose text-soft">{problemSentence(error)}</p>
      <div className="mt-3 flex flex-wrap justify-center gap-2">
        {retry && !missing && <Button onClick={retry}>Try again</Button>}
        {action}
      </div>
    </div>
  )
}
