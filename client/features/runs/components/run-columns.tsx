/** One run in the list: as columns of the table, and as a card on a phone. */
import type { ColumnDef } from '@tanstack/react-table'
import { Link } from 'react-router-dom'
import { Age } from '#client/components/ui/age.tsx'
import { Checkbox } from '#client/components/ui/checkbox.tsx'
import type { FigureKey } from '#shared/figures.ts'
import type { RunSummary } from '#shared/schemas/run.ts'
import { formatFigure } from '#shared/units/format-figure.ts'

export interface Picking {
  isPicked: (run: RunSummary) => boolean
  onPick: (run: RunSummary) => void
}

function PickBox({ run, isPicked, onPick }: Picking & { run: RunSummary }) {
  return (
    <Checkbox
      label={`Compare ${run.title}`}
      labelHidden
      checked={isPicked(run)}
      onChange={() => onPick(run)}
    />
  )
}

function RunTitle({ run }: { run: RunSummary }) {
  return (
    <div className="min-w-0">
      <Link to={`/runs/${run.id}`} className="font-medium text-petrol wrap-anywhere">
        {run.title}
      </Link>
      {run.note && <p className="line-clamp-1 max-w-prose text-sm text-soft wrap-anywhere">{run.note}</p>}
    </div>
  )
}

function Figure({ run, name }: { run: RunSummary; name: FigureKey }) {
  return <span className="whitespace-nowrap">{formatFigure(name, run.figures[name])}</span>
}

function Saved({ run }: { run: RunSummary }) {
  return <Age of={run.createdAt} className="whitespace-nowrap text-soft" />
}

/** Columns of the list; the ids of those that sort are the server's words. */
export function runColumns(picking: Picking): ColumnDef<RunSummary, unknown>[] {
  return [
    { id: 'pick', header: 'Compare', cell: ({ row }) => <PickBox run={row.original} {...picking} /> },
    { id: 'title', header: 'Run', enableSorting: true, cell: ({ row }) => <RunTitle run={row.original} /> },
    {
      id: 'design',
      header: 'Design',
      enableSorting: true,
      cell: ({ row: { original: run } }) => (
        <>
          <Link to={`/designs/${run.design.id}`} className="text-ink wrap-anywhere">
            {run.design.name}
          </Link>
          <p className="line-clamp-1 text-sm text-soft wrap-anywhere">{run.project.name}</p>
        </>
      ),
    },
    ...(['frequency', 'level', 'thd'] as const).map((name): ColumnDef<RunSummary, unknown> => ({
      id: name,
      header: { frequency: 'Frequency', level: 'Level', thd: 'THD' }[name],
      meta: { align: 'end' },
      cell: ({ row }) => <Figure run={row.original} name={name} />,
    })),
    {
      id: 'author',
      header: 'Saved by',
      enableSorting: true,
      cell: ({ row }) => <span className="xl:whitespace-nowrap">{row.original.author.name}</span>,
    },
    {
      id: 'createdAt',
      header: 'Saved',
      enableSorting: true,
      cell: ({ row }) => <Saved run={row.original} />,
    },
  ]
}

/** A run in the list on a phone. */
export function RunListCard({ run, ...picking }: Picking & { run: RunSummary }) {
  return (
    <article className="flex gap-2">
      <PickBox run={run} {...picking} />
      <div className="min-w-0 grow space-y-1">
        <RunTitle run={run} />
        <p className="text-sm text-soft wrap-anywhere">
          {run.design.name} · {run.author.name} · <Saved run={run} />
        </p>
        <p className="flex flex-wrap gap-x-4 text-sm">
          {run.figures.frequency === null ? (
            'No settled figures'
          ) : (
            <>
              <Figure run={run} name="frequency" />
              <span>
                <Figure run={run} name="level" /> peak
              </span>
              <span>
                THD <Figure run={run} name="thd" />
              </span>
            </>
          )}
        </p>
      </div>
    </article>
  )
}
