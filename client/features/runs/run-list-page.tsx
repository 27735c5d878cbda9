/** All saved runs: search, filter, sort, and pick two to compare. */
import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { Card } from '#client/components/ui/card.tsx'
import { DataTable } from '#client/components/ui/data-table.tsx'
import { EmptyState } from '#client/components/ui/empty-state.tsx'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { Loading } from '#client/components/ui/loading.tsx'
import { PageHeader } from '#client/components/ui/page-header.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { Pager } from '#client/components/ui/pager.tsx'
import { PickBar } from '#client/features/runs/components/pick-bar.tsx'
import { RunListCard, runColumns, type Picking } from '#client/features/runs/components/run-columns.tsx'
import { RunFilters } from '#client/features/runs/components/run-filters.tsx'
import { togglePick } from '#client/features/runs/lib/pick.ts'
import { runQueries } from '#client/features/runs/queries.ts'
import { useListParams } from '#client/lib/list-params.ts'
import { listRunsSchema, type ListRuns, type RunSummary } from '#shared/schemas/run.ts'

const noFilters: Partial<ListRuns> = { search: '', designId: undefined, authorId: undefined }

function Nothing({ filtered, onShowAll }: { filtered: boolean; onShowAll: () => void }) {
  return filtered ? (
    <EmptyState title="No run matches" action={<Button onClick={onShowAll}>Show all runs</Button>}>
      Try fewer words, another design or another person.
    </EmptyState>
  ) : (
    <EmptyState title="No runs yet" action={<LinkButton to="/designs">Open a design</LinkButton>}>
      A run keeps a result with all its inputs, so that others can replay it. Open a design and press “Save
      run”.
    </EmptyState>
  )
}

export function RunListPage() {
  const [params, change] = useListParams(listRunsSchema)
  const [picked, setPicked] = useState<readonly RunSummary[]>([])
  const list = useQuery(runQueries.list(params))
  const rows = list.data?.items ?? []
  const filtered = Boolean(params.search || params.designId || params.authorId)
  const picking: Picking = {
    isPicked: (run) => picked.some((other) => other.id === run.id),
    onPick: (run) => setPicked(togglePick(picked, run)),
  }

  return (
    <>
      <PageTitle>Runs</PageTitle>
      <PageHeader title="Runs" />
      <Card>
        <RunFilters params={params} shown={rows} onChange={change} />
        {rows.length > 0 && <PickBar picked={picked} onClear={() => setPicked([])} />}
        {list.isPending && <Loading label="Loading runs" />}
        {list.error && <ErrorState error={list.error} retry={() => void list.refetch()} />}
        {list.data && !list.error && rows.length === 0 && (
          <Nothing filtered={filtered} onShowAll={() => change(noFilters)} />
        )}
        {rows.length > 0 && !list.error && (
          <DataTable
            caption="Saved runs"
            columns={runColumns(picking)}
            rows={rows}
            rowKey={(run) => String(run.id)}
            sort={{ id: params.sort, order: params.order }}
            onSort={({ id, order }) => change({ sort: listRunsSchema.shape.sort.parse(id), order })}
            card={(run) => <RunListCard run={run} {...picking} />}
            stale={list.isPlaceholderData}
          />
        )}
      </Card>
      {list.data && rows.length > 0 && (
        <div className="pt-3">
          <Pager noun="run" list={list.data} onPage={(page) => change({ page })} />
        </div>
      )}
    </>
  )
}
