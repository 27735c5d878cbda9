/** A few cycles around the time to 90 %, with the page's own cursors. */
import { useMemo, useState } from 'react'
import type { Cursors, LimitSpan, View, WaveformSeries } from '#client/components/charts/chart-types.ts'
import { PlotCard } from '#client/components/charts/plot-card.tsx'
import { waveformTable } from '#client/components/charts/plot-table.ts'
import { keyItem } from '#client/components/charts/column-looks.ts'
import { WaveformChart } from '#client/components/charts/waveform-chart.tsx'
import type { CloseUp } from '#client/features/start-up/lib/close-up.ts'
import { startUpSeries } from '#client/features/start-up/lib/start-up-series.ts'
import type { Simulation } from '#sim/types.ts'

export interface CloseUpCardProps {
  simulation: Simulation
  spans: readonly LimitSpan[]
  closeUp: CloseUp
  cursors: Cursors
  onCursorsChange: (cursors: Cursors) => void
}

export function CloseUpCard({ simulation, spans, closeUp, cursors, onCursorsChange }: CloseUpCardProps) {
  const { sampleInterval } = simulation
  const series = useMemo(
    (): WaveformSeries[] => startUpSeries(simulation, { node: true, control: false }),
    [simulation],
  )
  const [moved, setMoved] = useState<{ of: number; view: View } | null>(null)
  // A view that was moved belongs to the close-up it was moved from; another record begins anew.
  const view = moved?.of === closeUp.view[0] ? moved.view : closeUp.view
  return (
    <PlotCard
      title={closeUp.title}
      keyItems={series.map(keyItem)}
      table={() => waveformTable(series, sampleInterval, view)}
    >
      <WaveformChart
        {...{ sampleInterval, series, spans, view, cursors, onCursorsChange }}
        onViewChange={(next) => setMoved({ of: closeUp.view[0], view: next })}
        height={210}
        label={`${closeUp.title}, output and network node, volts over time`}
      />
    </PlotCard>
  )
}
