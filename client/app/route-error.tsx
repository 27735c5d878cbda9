/** In place of a page whose loading or drawing failed. */
import { useQueryErrorResetBoundary } from '@tanstack/react-query'
import { useEffect } from 'react'
import { isRouteErrorResponse, useRevalidator, useRouteError } from 'react-router-dom'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { Button } from '#client/components/ui/button.tsx'
import { ApiError, OfflineError } from '#client/lib/api.ts'
import { reportReachable } from '#client/lib/reachability.ts'

/** A page's own file that cannot be had: the server is away, or has a newer version of the application. */
function isMissingChunk(error: unknown): boolean {
  return error instanceof TypeError && /import|module/i.test(error.message)
}

function NewVersion() {
  return (
    <div role="alert" className="flex flex-col items-center gap-2 px-6 py-12 text-center">
      <p className="text-lg font-medium">This page could not be loaded</p>
      <p className="max-w-prose text-soft">
        The server is away or has been updated since this tab was opened. Reloading fetches the page again.
      </p>
      <Button className="mt-3" onClick={() => window.location.reload()}>
        Reload
      </Button>
    </div>
  )
}

export function RouteError() {
  const error = useRouteError()
  const revalidator = useRevalidator()
  const { reset } = useQueryErrorResetBoundary()
  // Failures that the server or the network explains are told on the page; the rest are faults of ours.
  const explained = error instanceof ApiError || error instanceof OfflineError || isRouteErrorResponse(error)
  useEffect(() => {
    if (isMissingChunk(error)) reportReachable(false)
    else if (!explained) console.error(error)
  }, [error, explained])
  const retry = () => {
    reset()
    void revalidator.revalidate()
  }
  return (
    <section aria-label="Problem" className="mx-auto max-w-3xl py-8">
      <PageTitle>Problem</PageTitle>
      {isMissingChunk(error) ? <NewVersion /> : <ErrorState error={error} retry={retry} />}
      <p className="text-center">
        <LinkButton to="/designs" variant="quiet">
          Back to designs
        </LinkButton>
      </p>
    </section>
  )
}
