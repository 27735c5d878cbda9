/** One saved run: what it is, its replay, its record with the playhead, figures and inputs. */
import { useQueryClient } from '@tanstack/react-query'
import { Link, useNavigate } from 'react-router-dom'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { Loading } from '#client/components/ui/loading.tsx'
import { PageHeader } from '#client/components/ui/page-header.tsx'
import { PageTitle } from '#client/components/ui/page-title.tsx'
import { useStatus } from '#client/components/ui/status.tsx'
import { buttonClasses } from '#client/components/ui/button.tsx'
import { ComparePicker } from '#client/features/runs/components/compare-picker.tsx'
import { DeleteRunDialog } from '#client/features/runs/components/delete-run-dialog.tsx'
import { FiguresSection } from '#client/features/runs/components/figures-section.tsx'
import { HarmonicsSection } from '#client/features/runs/components/harmonics-section.tsx'
import { InputsSection } from '#client/features/runs/components/inputs-section.tsx'
import { RecordViewer } from '#client/features/runs/components/record-viewer.tsx'
import { ReplaySection } from '#client/features/runs/components/replay-section.tsx'
import { RunFacts } from '#client/features/runs/components/run-facts.tsx'
import { useReplay, type FoundReplay } from '#client/features/runs/hooks/use-replay.ts'
import { useRunRecord } from '#client/features/runs/hooks/use-run-record.ts'
import { mayDelete } from '#client/features/runs/lib/policy.ts'
import { exportUrl, runQueries } from '#client/features/runs/queries.ts'
import { useSession } from '#client/lib/session.ts'
import type { Run } from '#shared/schemas/run.ts'

function RunHeader({ run }: { run: Run }) {
  const { person } = useSession()
  const navigate = useNavigate()
  const queryClient = useQueryClient()
  const say = useStatus()
  async function leave() {
    say(`“${run.title}” was deleted.`)
    await navigate('/runs')
    queryClient.removeQueries({ queryKey: runQueries.detail(run.id).queryKey })
  }
  return (
    <PageHeader
      over={
        <>
          {run.project.name} ·{' '}
          <Link to={`/designs/${run.design.id}`} className="text-petrol underline">
            {run.design.name}
          </Link>
        </>
      }
      title={run.title}
      actions={
        <>
          {mayDelete(run, person) && <DeleteRunDialog run={run} onDeleted={() => void leave()} />}
          <a href={exportUrl(run.id)} download className={buttonClasses('plain')}>
            Export CSV
          </a>
          <ComparePicker runId={run.id} />
        </>
      }
    />
  )
}

/** Figures, harmonics and inputs; with a replay the figures need the whole width. */
function Numbers({ run, found }: { run: Run; found: FoundReplay | null }) {
  return (
    <div className="grid items-start gap-4 lg:grid-cols-2">
      <div className={found ? 'min-w-0 lg:col-span-2' : 'min-w-0'}>
        <FiguresSection run={run} replayed={found?.comparison.figures ?? null} />
      </div>
      {found?.tone && <HarmonicsSection tone={found.tone} />}
      <InputsSection inputs={run.inputs} />
    </div>
  )
}

/** All that needs the record: without its samples there is nothing to draw and nothing to compare a replay with. */
function RecordParts({ run, columns }: { run: Run; columns: readonly Float64Array[] }) {
  const replay = useReplay(run, columns)
  const found = replay.state.kind === 'compared' ? replay.state : null
  return (
    <>
      <ReplaySection run={run} replay={replay} />
      <RecordViewer run={run} columns={columns} />
      <Numbers run={run} found={found} />
    </>
  )
}

export function RunPage({ runId }: { runId: number }) {
  const { run, columns, error, retry } = useRunRecord(runId)
  if (!run)
    return (
      <>
        <PageTitle>Run</PageTitle>
        <PageHeader title="Run" />
        {error ? (
          <ErrorState error={error} retry={retry} action={<LinkButton to="/runs">All runs</LinkButton>} />
        ) : (
          <Loading label="Loading the run" />
        )}
      </>
    )
  return (
    <>
      <PageTitle>{run.title}</PageTitle>
      <RunHeader run={run} />
      <div className="space-y-4">
        <RunFacts run={run} />
        {columns ? (
          <RecordParts run={run} columns={columns} />
        ) : (
          <>
            {error ? <ErrorState error={error} retry={retry} /> : <Loading label="Loading the record" />}
            <Numbers run={run} found={null} />
          </>
        )}
      </div>
    </>
  )
}
