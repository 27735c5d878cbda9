import { EmptyState } from '#client/components/ui/empty-state.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'

/** No page has this address. */
export function Component() {
  return (
    <>
      <PageTitle>Page not found</PageTitle>
      <h1 className="sr-only">Page not found</h1>
      <EmptyState
        title="There is no page at this address"
        action={
          <LinkButton to="/designs" variant="main">
            To the designs
          </LinkButton>
        }
      >
        The link may be incomplete, or what it led to may have been deleted.
      </EmptyState>
    </>
  )
}
