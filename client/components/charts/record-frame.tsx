/**
 * Around everything that shows a live record: what is being computed and how to stop it, that what is shown is out
 * of date, why there is nothing. Its first line keeps its height, so that nothing below jumps.
 */
import type { ReactNode } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { classNames } from '#client/components/ui/class-names.ts'
import { EmptyState } from '#client/components/ui/empty-state.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import type { LiveResult } from '#client/lib/live-result.ts'
import { formatCount, formatPercent, formatQuantity } from '#shared/units/format.ts'
import type { Simulation } from '#sim/types.ts'

export interface RecordFrameProps {
  live: LiveResult
  children: (simulation: Simulation) => ReactNode
}

function Progress({ done, onCancel }: { done: number; onCancel?: () => void }) {
  return (
    <div className="late flex grow flex-wrap items-center gap-x-3">
      <span className="whitespace-nowrap">Computing the record, {formatPercent(done, { digits: 2 })}</span>
      <progress
        aria-label="Computing the record"
        value={done}
        max={1}
        className="h-1.5 w-16 max-w-60 grow appearance-none overflow-hidden rounded-full bg-line [&::-moz-progress-bar]:bg-petrol [&::-webkit-progress-bar]:bg-line [&::-webkit-progress-value]:bg-petrol"
      />
      {onCancel && (
        <Button variant="quiet" onClick={onCancel}>
          Cancel
        </Button>
      )}
    </div>
  )
}

function StatusLine({ live }: { live: LiveResult }) {
  const { simulation, failure, progress, stale, resume } = live
  return (
    <div className="flex min-h-9 flex-wrap items-center gap-x-4 py-1 text-sm text-soft">
      {progress !== null && <Progress done={progress} onCancel={live.cancel} />}
      {stale && simulation && (
        <span className="late rounded-full bg-warn-wash px-2.5 py-0.5 text-warn">
          Out of date: this record belongs to earlier values
        </span>
      )}
      {stale && progress === null && !failure && resume && (
        <Button variant="quiet" onClick={resume}>
          Compute the record
        </Button>
      )}
      {!stale && progress === null && simulation && (
        <span>
          Record of {formatQuantity((simulation.vo.length - 1) * simulation.sampleInterval, 's')} from
          power-on: {formatCount(simulation.vo.length)} samples, one every{' '}
          {formatQuantity(simulation.sampleInterval, 's')}
        </span>
      )}
    </div>
  )
}

export function RecordFrame({ live, children }: RecordFrameProps) {
  const { simulation, failure, progress, stale } = live
  return (
    <div className="min-w-0">
      {failure && (
        <Notice tone="bad" title="There is no record for these values" className="mb-2">
          {failure.sentence}
        </Notice>
      )}
      <StatusLine live={live} />
      {simulation && (
        <div className={classNames('transition-[filter]', stale && 'grayscale delay-300')}>
          {children(simulation)}
        </div>
      )}
      {!simulation && !failure && (
        <EmptyState title={progress === null ? 'No record yet' : 'The first record is on its way'}>
          {progress === null
            ? 'A record appears here as soon as every value is valid.'
            : 'It appears here when it is complete.'}
        </EmptyState>
      )}
    </div>
  )
}
