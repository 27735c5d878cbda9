import type { ColumnDef } from '@tanstack/react-table'
import { useMemo } from 'react'
import { Link } from 'react-router-dom'
import { Age } from '#client/components/ui/age.tsx'
import { DataTable } from '#client/components/ui/data-table.tsx'
import type { Sort } from '#client/components/ui/sorting.tsx'
import { DesignMenu } from '#client/features/designs/components/design-menu.tsx'
import type { DesignSummary } from '#shared/schemas/design.ts'

export interface DesignTableProps {
  designs: readonly DesignSummary[]
  sort: Sort
  onSort: (sort: Sort) => void
  stale: boolean
  mayEdit: boolean
}

function NameLink({ design }: { design: DesignSummary }) {
  return (
    <Link
      to={`/designs/${design.id}/start-up`}
      className="inline-flex min-h-8 items-center font-medium wrap-anywhere text-petrol hover:underline"
    >
      {design.name}
    </Link>
  )
}

/** When, and by whom. */
function Changed({ design }: { design: DesignSummary }) {
  return (
    <>
      <Age of={design.updatedAt} /> <span className="text-soft">by {design.updatedBy.name}</span>
    </>
  )
}

function runsLink(design: DesignSummary) {
  if (design.runs === 0) return <span className="text-soft">none</span>
  return (
    <Link
      to={`/runs?designId=${design.id}`}
      aria-label={`${design.runs} ${design.runs === 1 ? 'run' : 'runs'} of ${design.name}`}
      className="inline-flex min-h-8 min-w-8 items-center justify-end text-petrol hover:underline"
    >
      {design.runs}
    </Link>
  )
}

function columnsFor(mayEdit: boolean): ColumnDef<DesignSummary, unknown>[] {
  const columns: ColumnDef<DesignSummary, unknown>[] = [
    {
      id: 'name',
      header: 'Name',
      enableSorting: true,
      cell: ({ row }) => <NameLink design={row.original} />,
    },
    { id: 'project', header: 'Project', enableSorting: true, cell: ({ row }) => row.original.project.name },
    { id: 'runs', header: 'Runs', meta: { align: 'end' }, cell: ({ row }) => runsLink(row.original) },
    {
      id: 'updatedAt',
      header: 'Changed',
      enableSorting: true,
      cell: ({ row }) => <Changed design={row.original} />,
    },
  ]
  if (mayEdit)
    columns.push({
      id: 'actions',
      header: () => <span className="sr-only">Actions</span>,
      meta: { align: 'end' },
      cell: ({ row }) => <DesignMenu design={row.original} />,
    })
  return columns
}

/** The list of designs; what can be done to one is there only for those who may edit. */
export function DesignTable({ designs, sort, onSort, stale, mayEdit }: DesignTableProps) {
  const columns = useMemo(() => columnsFor(mayEdit), [mayEdit])
  return (
    <DataTable
      caption="Designs"
      columns={columns}
      rows={designs}
      rowKey={(design) => String(design.id)}
      sort={sort}
      onSort={onSort}
      stale={stale}
      card={(design) => (
        <div className="flex items-start gap-2">
          <div className="min-w-0 grow">
            <NameLink design={design} />
            <p className="text-sm text-soft">{design.project.name}</p>
            <p className="text-sm">
              <Changed design={design} />
            </p>
          </div>
          {mayEdit && <DesignMenu design={design} />}
        </div>
      )}
    />
  )
}
