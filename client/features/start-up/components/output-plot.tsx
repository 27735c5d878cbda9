/** "Output from power-on": the record with envelope, limits and cursors, its overview and its CSV file. */
import { useMemo, useState } from 'react'
import type { Cursors, LimitSpan, View } from '#client/components/charts/chart-types.ts'
import { CursorTable } from '#client/components/charts/cursor-table.tsx'
import { OverviewStrip } from '#client/components/charts/overview-strip.tsx'
import { PlotHints } from '#client/components/charts/plot-hints.tsx'
import { PlotCard, type KeyItem } from '#client/components/charts/plot-card.tsx'
import { waveformTable } from '#client/components/charts/plot-table.ts'
import { keyItem, limitKeyItems } from '#client/components/charts/column-looks.ts'
import { saveText, spanCsv } from '#client/components/charts/span-csv.ts'
import { WaveformChart, wholeView } from '#client/components/charts/waveform-chart.tsx'
import { Button } from '#client/components/ui/button.tsx'
import { Checkbox } from '#client/components/ui/checkbox.tsx'
import { envelopeLine } from '#client/features/start-up/lib/envelope-line.ts'
import { startUpSeries, type SeriesChoice } from '#client/features/start-up/lib/start-up-series.ts'
import { formatQuantity } from '#shared/units/format.ts'
import type { Simulation } from '#sim/types.ts'

export interface OutputPlotProps {
  simulation: Simulation
  /** A single supply's reference, V above the negative rail; volts can then be shown from either. */
  reference: number | undefined
  spans: readonly LimitSpan[]
  view: View
  onViewChange: (view: View) => void
  cursors: Cursors
  onCursorsChange: (cursors: Cursors) => void
}

export function OutputPlot({ simulation, reference, spans, ...rest }: OutputPlotProps) {
  const { sampleInterval, figures, control } = simulation
  const { view, onViewChange, cursors } = rest
  const [choice, setChoice] = useState<SeriesChoice>({ node: false, control: false })
  const [fromRail, setFromRail] = useState(false)
  const [saving, setSaving] = useState(false)
  const lift = fromRail ? (reference ?? 0) : 0
  const series = useMemo(() => startUpSeries(simulation, choice, lift), [simulation, choice, lift])
  const overview = useMemo(() => startUpSeries(simulation, { node: false, control: false }), [simulation])
  const envelope = useMemo(() => envelopeLine(simulation.envelope, lift), [simulation.envelope, lift])
  const whole = wholeView(overview, sampleInterval)
  const timeTo90 = figures?.timeTo90 ?? null
  const marks = useMemo(
    () =>
      timeTo90 === null
        ? []
        : [{ time: timeTo90, label: `90 % at ${formatQuantity(timeTo90, 's', { digits: 3 })}` }],
    [timeTo90],
  )
  const keyItems: KeyItem[] = [
    ...series.map(keyItem),
    { label: 'envelope', sign: 'copper' },
    ...limitKeyItems(spans),
  ]

  async function save() {
    setSaving(true)
    try {
      saveText(await spanCsv(series, sampleInterval, view), 'output-from-power-on.csv')
    } finally {
      setSaving(false)
    }
  }

  return (
    <PlotCard
      title="Output from power-on"
      keyItems={keyItems}
      table={() => waveformTable(series, sampleInterval, view)}
      actions={
        <Button variant="quiet" busy={saving} onClick={save}>
          Save span as CSV
        </Button>
      }
      footer={<CursorTable series={series} sampleInterval={sampleInterval} cursors={cursors} />}
    >
      <WaveformChart
        {...{ sampleInterval, series, envelope, spans, marks }}
        {...rest}
        label="Output from power-on, volts over time"
      />
      <OverviewStrip series={overview[0]!} {...{ sampleInterval, view, onViewChange }} />
      <div className="flex flex-wrap items-center gap-x-5 px-2 pt-1.5 text-sm text-soft">
        <Checkbox
          label="Network node"
          checked={choice.node}
          onChange={(event) => setChoice({ ...choice, node: event.target.checked })}
        />
        {control && (
          <Checkbox
            label={control.name}
            checked={choice.control}
            onChange={(event) => setChoice({ ...choice, control: event.target.checked })}
          />
        )}
        {reference !== undefined && (
          <Checkbox
            label="Volts from the negative rail"
            checked={fromRail}
            onChange={(event) => setFromRail(event.target.checked)}
          />
        )}
        <PlotHints view={view} whole={whole} onViewChange={onViewChange} />
      </div>
    </PlotCard>
  )
}
