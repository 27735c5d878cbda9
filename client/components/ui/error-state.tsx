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
  /** Offered as "Try again". */
  retry?: () => void
}

/** A page or list that could not be had: what happened, and what to do. */
export function ErrorState({ error, retry }: ErrorStateProps) {
  return (
    <div role="alert" className="flex flex-col items-center gap-2 px-6 py-12 text-center">
      <p className="text-lg font-medium">{headline(error)}</p>
      <p className="max-w-prose text-soft">{problemSentence(error)}</p>
      {retry && (
        <Button className="mt-3" onClick={retry}>
          Try again
        </Button>
      )}
    </div>
  )
}
