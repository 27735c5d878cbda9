/** One exact settled period of output and network node. */
import { useMemo, useState } from 'react'
import type { Cursors, View } from '#client/components/charts/chart-types.ts'
import { CursorTable } from '#client/components/charts/cursor-table.tsx'
import { PlotHints } from '#client/components/charts/plot-hints.tsx'
import { PlotCard } from '#client/components/charts/plot-card.tsx'
import { waveformTable } from '#client/components/charts/plot-table.ts'
import { keyItem } from '#client/components/charts/column-looks.ts'
import { WaveformChart, wholeView } from '#client/components/charts/waveform-chart.tsx'
import { onePeriod } from '#client/features/tone/lib/one-period.ts'
import type { SettledTone } from '#sim/types.ts'

export function PeriodCard({ tone }: { tone: SettledTone }) {
  const { series, sampleInterval } = useMemo(() => onePeriod(tone), [tone])
  const [zoom, setZoom] = useState<{ of: SettledTone; view: View } | null>(null)
  const [cursors, setCursors] = useState<Cursors>([null, null])
  const whole = useMemo(() => wholeView(series, sampleInterval), [series, sampleInterval])
  const view = zoom?.of === tone ? zoom.view : whole
  const change = (next: View) => setZoom({ of: tone, view: next })
  return (
    <PlotCard
      title="One settled period"
      keyItems={series.map(keyItem)}
      table={() => waveformTable(series, sampleInterval, view)}
      footer={<CursorTable {...{ series, sampleInterval, cursors }} />}
    >
      <WaveformChart
        {...{ sampleInterval, series, view, cursors }}
        onViewChange={change}
        onCursorsChange={setCursors}
        height={260}
        label="One settled period of output and network node, volts over time"
      />
      <PlotHints view={view} whole={whole} wholeName="Whole period" strip={false} onViewChange={change} />
    </PlotCard>
  )
}
