/** Two runs in one plot, and what differs between them in figures and inputs. */
import { useMemo } from 'react'
import { Link } from 'react-router-dom'
import { Card } from '#client/components/ui/card.tsx'
import { EmptyState } from '#client/components/ui/empty-state.tsx'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { Loading } from '#client/components/ui/loading.tsx'
import { PageHeader } from '#client/components/ui/page-header.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { ComparePlot } from '#client/features/runs/components/compare-plot.tsx'
import { CompareFigures, CompareInputs } from '#client/features/runs/components/compare-tables.tsx'
import { useRunRecord, type RunRecord } from '#client/features/runs/hooks/use-run-record.ts'
import { comparePath } from '#client/features/runs/lib/pick.ts'
import { formatMoment } from '#client/lib/dates.ts'
import type { Run } from '#shared/schemas/run.ts'

function RunCard({ letter, run }: { letter: 'A' | 'B'; run: Run }) {
  const edge = letter === 'A' ? 'border-l-petrol' : 'border-l-copper'
  return (
    <Card className={`border-l-4 px-4 py-3 ${edge}`}>
      <p className="wrap-anywhere">
        <b className="mr-2">{letter}</b>
        <Link to={`/runs/${run.id}`} className="font-medium text-petrol">
          {run.title}
        </Link>
      </p>
      <p className="text-sm text-soft wrap-anywhere">
        {run.design.name} · {run.author.name} · {formatMoment(run.createdAt)} · engine {run.engineVersion}
      </p>
    </Card>
  )
}

/** Both records once they are there. */
function Plot({ a, b }: { a: RunRecord; b: RunRecord }) {
  const sideA = useMemo(() => a.run && a.columns && { run: a.run, columns: a.columns }, [a.run, a.columns])
  const sideB = useMemo(() => b.run && b.columns && { run: b.run, columns: b.columns }, [b.run, b.columns])
  if (sideA && sideB) return <ComparePlot a={sideA} b={sideB} />
  const failed = a.error ? a : b
  return failed.error ? (
    <ErrorState error={failed.error} retry={failed.retry} />
  ) : (
    <Loading label="Loading the records" className="min-h-96" />
  )
}

function Comparison({ a: idA, b: idB }: { a: number; b: number }) {
  const a = useRunRecord(idA)
  const b = useRunRecord(idB)
  if (!a.run || !b.run) {
    const failed = a.error ? a : b
    return failed.error ? (
      <ErrorState error={failed.error} retry={failed.retry} />
    ) : (
      <Loading label="Loading both runs" />
    )
  }
  return (
    <div className="space-y-4">
      <div className="grid gap-4 md:grid-cols-2">
        <RunCard letter="A" run={a.run} />
        <RunCard letter="B" run={b.run} />
      </div>
      <Plot a={a} b={b} />
      <div className="grid items-start gap-4 xl:grid-cols-2">
        <CompareFigures a={a.run} b={b.run} />
        <CompareInputs a={a.run} b={b.run} />
      </div>
    </div>
  )
}

/** Null where the address names no run, or one run twice. */
export interface CompareRunsPageProps {
  a: number | null
  b: number | null
}

export function CompareRunsPage({ a, b }: CompareRunsPageProps) {
  const complete = a !== null && b !== null && a !== b
  return (
    <>
      <PageTitle>Compare runs</PageTitle>
      <PageHeader
        title="Compare runs"
        actions={
          <>
            {complete && <LinkButton to={comparePath(b, a)}>Swap A and B</LinkButton>}
            <LinkButton to="/runs">All runs</LinkButton>
          </>
        }
      />
      {complete ? (
        <Comparison key={`${a} ${b}`} a={a} b={b} />
      ) : (
        <Card>
          <EmptyState
            title="Two different runs are needed"
            action={
              <LinkButton variant="main" to="/runs">
                Pick two runs
              </LinkButton>
            }
          >
            The address does not name two runs. Tick two in the list.
          </EmptyState>
        </Card>
      )}
    </>
  )
}
