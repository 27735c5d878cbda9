import { recordEnd } from '#client/features/runs/lib/record-series.ts'
import { formatMoment } from '#client/lib/dates.ts'
import type { Run } from '#shared/schemas/run.ts'
import { formatCount, formatQuantity } from '#shared/units/format.ts'

/** Who saved the run, when, with which engine, and its note. */
export function RunFacts({ run }: { run: Run }) {
  const { samples, sampleInterval } = run.record
  const duration = formatQuantity(recordEnd(run.record), 's')
  const facts = [
    ['Saved by', run.author.name],
    ['Saved', formatMoment(run.createdAt)],
    ['Engine', run.engineVersion],
    [
      'Record',
      `${duration}, ${formatCount(samples)} samples, one every ${formatQuantity(sampleInterval, 's')}`,
    ],
  ] as const
  return (
    <div className="space-y-3">
      {run.note && <p className="max-w-prose whitespace-pre-line wrap-anywhere">{run.note}</p>}
      <dl className="flex flex-wrap gap-x-8 gap-y-2">
        {facts.map(([name, value]) => (
          <div key={name}>
            <dt className="text-sm text-soft">{name}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
    </div>
  )
}
