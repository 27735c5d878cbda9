import { useParams } from 'react-router-dom'
import { EngineProvider } from '#client/app/engine-provider.tsx'
import { EmptyState } from '#client/components/ui/empty-state.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { RunPage } from '#client/features/runs/run-page.tsx'
import { readId } from '#client/lib/read-id.ts'

/** One saved run. Another run starts the page afresh: its view, its playhead and its replay are its own. */
export function Component() {
  const runId = readId(useParams().runId)
  if (runId !== null)
    return (
      <EngineProvider>
        <RunPage key={runId} runId={runId} />
      </EngineProvider>
    )
  return (
    <>
      <PageTitle>Run not found</PageTitle>
      <EmptyState title="There is no such run" action={<LinkButton to="/runs">All runs</LinkButton>}>
        The address does not name a run.
      </EmptyState>
    </>
  )
}
