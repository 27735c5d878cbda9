import { Notice } from '#client/components/ui/notice.tsx'
import { Cell, PlainTable, RowHead } from '#client/components/ui/plain-table.tsx'
import { Outcome } from '#client/features/runs/components/outcome.tsx'
import { formatShare } from '#client/features/runs/lib/format-difference.ts'
import { replayVerdict } from '#client/features/runs/lib/replay-verdict.ts'
import { waveformTolerance, type ReplayComparison } from '#shared/replay.ts'
import type { RecordLayout } from '#shared/schemas/run.ts'
import { formatPercent, formatQuantity } from '#shared/units/format.ts'

function WaveformRows({ comparison, layout }: { comparison: ReplayComparison; layout: RecordLayout }) {
  return (
    <PlainTable
      caption="Largest deviation of each waveform"
      heads={['Waveform', 'Largest deviation', 'At', 'Of its peak', 'Tolerance', 'Outcome']}
    >
      {comparison.columns?.map((row, index) => {
        const { name, unit } = layout.columns[index]!
        return (
          <tr key={name} className={row.passes ? undefined : 'bg-bad-wash'}>
            <RowHead>{name}</RowHead>
            <Cell>{formatQuantity(row.deviation, unit, { digits: 3 })}</Cell>
            <Cell>{row.deviation === 0 ? '–' : formatQuantity(row.time, 's', { digits: 5 })}</Cell>
            <Cell>{formatShare(row.relative)}</Cell>
            <Cell>{formatPercent(waveformTolerance)} of its peak</Cell>
            <Cell>
              <Outcome passes={row.passes} />
            </Cell>
          </tr>
        )
      })}
    </PlainTable>
  )
}

export interface ReplayResultProps {
  comparison: ReplayComparison
  layout: RecordLayout
  /** Of the engine that computed the stored run, and of the one in this page. */
  storedVersion: string
  replayedVersion: string
}

/** What a replay found: verdict, versions and every waveform. The figures stand in a table of their own. */
export function ReplayResult({ comparison, layout, storedVersion, replayedVersion }: ReplayResultProps) {
  const verdict = replayVerdict(comparison, layout)
  const versions =
    storedVersion === replayedVersion
      ? `Both by engine ${storedVersion}.`
      : `Stored by engine ${storedVersion}, replayed by engine ${replayedVersion}: small differences are to be expected.`
  return (
    <div className="space-y-2 pb-1">
      <Notice tone={verdict.passes ? 'ok' : 'bad'} title={verdict.title} className="mx-4">
        <p>
          {verdict.sentence} {versions}
        </p>
      </Notice>
      {comparison.columns && <WaveformRows comparison={comparison} layout={layout} />}
    </div>
  )
}
