import { Button } from '#client/components/ui/button.tsx'
import { EmptyState } from '#client/components/ui/empty-state.tsx'
import type { ListDesigns } from '#shared/schemas/design.ts'

export interface NoDesignsProps {
  params: ListDesigns
  change: (part: Partial<ListDesigns>) => void
  /** Absent for those who may not create one. */
  create?: () => void
}

/** Why the list is empty: nothing found, nothing archived, or nothing there yet. */
export function NoDesigns({ params, change, create }: NoDesignsProps) {
  if (params.search || params.projectId)
    return (
      <EmptyState
        title="Nothing found"
        action={
          <Button onClick={() => change({ search: '', projectId: undefined })}>
            Clear search and project
          </Button>
        }
      >
        {params.search ? (
          <p className="wrap-anywhere">No design or project has “{params.search}” in its name here.</p>
        ) : (
          <p>This project has no {params.archived === 'true' ? 'archived' : 'current'} designs.</p>
        )}
      </EmptyState>
    )
  if (params.archived === 'true')
    return (
      <EmptyState
        title="Nothing is archived"
        action={<Button onClick={() => change({ archived: 'false' })}>Show current designs</Button>}
      >
        <p>Archived designs keep their runs and can be restored.</p>
      </EmptyState>
    )
  return (
    <EmptyState
      title="No designs yet"
      action={
        create && (
          <Button variant="main" onClick={create}>
            Create the first design
          </Button>
        )
      }
    >
      {create ? (
        <p>A design begins with equal arms near 1 kHz that start and clip; change it from there.</p>
      ) : (
        <p>Engineers create designs; they appear here.</p>
      )}
    </EmptyState>
  )
}
