/** /designs/:designId and the pages under it. */
import { useQuery } from '@tanstack/react-query'
import { ErrorBoundary } from 'react-error-boundary'
import { Outlet, useLocation, useParams } from 'react-router-dom'
import { EngineProvider } from '#client/app/engine-provider.tsx'
import { EmptyState } from '#client/components/ui/empty-state.tsx'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { Loading } from '#client/components/ui/loading.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { SaveRunDialog } from '#client/features/runs/components/save-run-dialog.tsx'
import { DesignSheet } from '#client/features/sheet/design-sheet.tsx'
import { useSheet } from '#client/features/sheet/hooks/use-sheet.ts'
import { sheetQueries } from '#client/features/sheet/queries.ts'
import { readId } from '#client/lib/read-id.ts'
import type { Design } from '#shared/schemas/design.ts'

const pages = [
  { to: 'start-up', name: 'Start-up', question: 'Does it start?' },
  { to: 'tone', name: 'Tone', question: 'What comes out?' },
]

/** A page that fails leaves the circuit, its figures and what was typed alone. */
function OpenSheet({ design }: { design: Design }) {
  const { pathname } = useLocation()
  const state = useSheet(design)
  const { content } = state.sheet
  const { circuit, stimulus, timing } = content
  return (
    <DesignSheet
      state={state}
      pages={pages}
      actions={
        <SaveRunDialog design={design} inputs={{ circuit, stimulus, timing }} disabled={state.invalid} />
      }
    >
      <ErrorBoundary
        resetKeys={[pathname]}
        fallbackRender={({ error, resetErrorBoundary }) => (
          <ErrorState error={error} retry={resetErrorBoundary} />
        )}
      >
        <Outlet context={state.sheet} />
      </ErrorBoundary>
    </DesignSheet>
  )
}

function LoadedSheet({ designId }: { designId: number }) {
  const design = useQuery(sheetQueries.detail(designId))
  if (design.data)
    return (
      <EngineProvider>
        <PageTitle>{design.data.name}</PageTitle>
        <OpenSheet design={design.data} />
      </EngineProvider>
    )
  if (design.error)
    return (
      <ErrorState
        error={design.error}
        retry={() => void design.refetch()}
        action={<LinkButton to="/designs">All designs</LinkButton>}
      />
    )
  return <Loading label="Loading the design" />
}

/** Another design starts the sheet afresh. */
export function Component() {
  const designId = readId(useParams().designId)
  if (designId !== null) return <LoadedSheet key={designId} designId={designId} />
  return (
    <>
      <PageTitle>Design not found</PageTitle>
      <EmptyState title="There is no such design" action={<LinkButton to="/designs">All designs</LinkButton>}>
        The address does not name a design.
      </EmptyState>
    </>
  )
}
