import { Button } from '#client/components/ui/button.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import { ReplayResult } from '#client/features/runs/components/replay-result.tsx'
import { Section } from '#client/features/runs/components/section.tsx'
import type { Replay } from '#client/features/runs/hooks/use-replay.ts'
import type { Run } from '#shared/schemas/run.ts'

function Progress({ done }: { done: number }) {
  const percent = Math.round(done * 100)
  return (
    <div className="flex items-center gap-3 px-4 pb-4">
      <progress aria-label="Replay" value={done} max={1} className="h-1.5 grow accent-petrol" />
      <span className="w-12 text-right text-soft">{percent} %</span>
    </div>
  )
}

/** Replay: computes the run again in this browser and shows how far the two agree. */
export function ReplaySection({ run, replay }: { run: Run; replay: Replay }) {
  const { state, start, cancel } = replay
  const action =
    state.kind === 'computing' ? (
      <Button onClick={cancel}>Cancel</Button>
    ) : (
      <Button variant={state.kind === 'compared' ? 'plain' : 'main'} onClick={start}>
        {state.kind === 'idle' ? 'Replay' : 'Replay again'}
      </Button>
    )
  return (
    <Section title="Replay" actions={action}>
      {state.kind === 'idle' && (
        <p data-print="hidden" className="max-w-prose px-4 pb-4 text-soft">
          Computes the run again from its inputs, here in your browser, and compares every figure and every
          sample with what is stored.
        </p>
      )}
      {state.kind === 'computing' && <Progress done={state.done} />}
      {state.kind === 'failed' && (
        <Notice tone="bad" title="The replay did not finish" className="mx-4 mb-4">
          {state.sentence}
        </Notice>
      )}
      {state.kind === 'compared' && (
        <ReplayResult
          comparison={state.comparison}
          layout={run.record}
          storedVersion={run.engineVersion}
          replayedVersion={state.engineVersion}
        />
      )}
    </Section>
  )
}
