/** Home: every design, found by search, project and order; all of it in the address. */
import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { Card } from '#client/components/ui/card.tsx'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { Loading } from '#client/components/ui/loading.tsx'
import { PageHeader } from '#client/components/ui/page-header.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { Pager } from '#client/components/ui/pager.tsx'
import { CreateDesignDialog } from '#client/features/designs/components/create-design-dialog.tsx'
import { DesignTable } from '#client/features/designs/components/design-table.tsx'
import { Filters } from '#client/features/designs/components/filters.tsx'
import { NoDesigns } from '#client/features/designs/components/no-designs.tsx'
import { designQueries } from '#client/features/designs/queries.ts'
import { useListParams } from '#client/lib/list-params.ts'
import { useIncludesRole } from '#client/lib/session.ts'
import { listDesignsSchema } from '#shared/schemas/design.ts'

export function DesignsPage() {
  const [params, change] = useListParams(listDesignsSchema)
  const list = useQuery(designQueries.list(params))
  const mayEdit = useIncludesRole('engineer')
  const [creating, setCreating] = useState(false)
  const create = mayEdit ? () => setCreating(true) : undefined

  return (
    <>
      <PageTitle>Designs</PageTitle>
      <PageHeader
        title="Designs"
        actions={
          create && (
            <Button variant="main" onClick={create}>
              New design
            </Button>
          )
        }
      />
      <Card>
        <Filters params={params} change={change} />
        {list.isPending && <Loading label="Loading designs" className="min-h-80" />}
        {list.isError && !list.data && <ErrorState error={list.error} retry={() => void list.refetch()} />}
        {list.data?.total === 0 && <NoDesigns params={params} change={change} create={create} />}
        {list.data && list.data.total > 0 && (
          <>
            <DesignTable
              designs={list.data.items}
              sort={{ id: params.sort, order: params.order }}
              onSort={(sort) =>
                change({ sort: listDesignsSchema.shape.sort.parse(sort.id), order: sort.order })
              }
              stale={list.isPlaceholderData}
              mayEdit={mayEdit}
            />
            <div className="border-t border-hair px-4 py-2.5">
              <Pager noun="design" list={list.data} onPage={(page) => change({ page })} />
            </div>
          </>
        )}
      </Card>
      {mayEdit && (
        <CreateDesignDialog open={creating} onOpenChange={setCreating} projectId={params.projectId} />
      )}
    </>
  )
}
