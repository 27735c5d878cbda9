import { useMemo, useState } from 'react'
import { CursorTable } from '#client/components/charts/cursor-table.tsx'
import { OverviewStrip } from '#client/components/charts/overview-strip.tsx'
import { PlotCard } from '#client/components/charts/plot-card.tsx'
import { PlotHints } from '#client/components/charts/plot-hints.tsx'
import { waveformTable } from '#client/components/charts/plot-table.ts'
import { keyItem } from '#client/components/charts/column-looks.ts'
import { WaveformChart } from '#client/components/charts/waveform-chart.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { recordEnd } from '#client/features/runs/lib/record-series.ts'
import { comparedSeries, type Side } from '#client/features/runs/lib/compared-series.ts'
import { useViewParams } from '#client/lib/use-view-params.ts'

/** One waveform of both runs in one plot, aligned at power-on. */
export function ComparePlot({ a, b }: { a: Side; b: Side }) {
  const names = a.run.record.columns
    .map((column) => column.name)
    .filter((name) => b.run.record.columns.some((column) => column.name === name))
  const [name, setName] = useState(names[0]!)
  const end = Math.max(recordEnd(a.run.record), recordEnd(b.run.record))
  const [{ view, cursors }, change] = useViewParams(0, end)
  const series = useMemo(() => comparedSeries(a, b, name), [a, b, name])
  const { sampleInterval } = a.run.record
  const longest = recordEnd(b.run.record) > recordEnd(a.run.record) ? series[1] : series[0]
  return (
    <PlotCard
      title="Both from power-on"
      keyItems={series.map(keyItem)}
      table={() => waveformTable(series, sampleInterval, view)}
      actions={
        <Field label="Waveform" labelHidden className="w-44">
          <Select value={name} onChange={(event) => setName(event.target.value)}>
            {names.map((option) => (
              <option key={option}>{option}</option>
            ))}
          </Select>
        </Field>
      }
      footer={<CursorTable series={series} sampleInterval={sampleInterval} cursors={cursors} />}
    >
      <WaveformChart
        label={`${name} of both runs from power-on`}
        sampleInterval={sampleInterval}
        series={series}
        view={view}
        onViewChange={(next) => change({ view: next })}
        cursors={cursors}
        onCursorsChange={(next) => change({ cursors: next })}
      />
      <OverviewStrip
        series={longest}
        sampleInterval={sampleInterval}
        view={view}
        onViewChange={(next) => change({ view: next })}
      />
      <PlotHints view={view} whole={[0, end]} onViewChange={(next) => change({ view: next })} />
    </PlotCard>
  )
}
