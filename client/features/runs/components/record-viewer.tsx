/** The stored record: waveform, cursors and the playhead, with the circuit beside it that shows what limits. */
import { useMemo, useState } from 'react'
import { CursorTable } from '#client/components/charts/cursor-table.tsx'
import { limitSpans } from '#client/components/charts/limit-spans.ts'
import { OverviewStrip } from '#client/components/charts/overview-strip.tsx'
import { PlotCard } from '#client/components/charts/plot-card.tsx'
import { PlotHints } from '#client/components/charts/plot-hints.tsx'
import { waveformTable } from '#client/components/charts/plot-table.ts'
import { keyItem, limitKeyItems } from '#client/components/charts/column-looks.ts'
import { WaveformChart } from '#client/components/charts/waveform-chart.tsx'
import { Checkbox } from '#client/components/ui/checkbox.tsx'
import { PlayheadBar } from '#client/features/runs/components/playhead-bar.tsx'
import { RunCircuit } from '#client/features/runs/components/run-circuit.tsx'
import { usePlayhead } from '#client/features/runs/hooks/use-playhead.ts'
import { follow, modeAt, speedChoices, usualSpeed } from '#client/features/runs/lib/playhead.ts'
import { recordEnd, recordSeries } from '#client/features/runs/lib/record-series.ts'
import { useViewParams } from '#client/lib/use-view-params.ts'
import type { Run } from '#shared/schemas/run.ts'

/** Periods that "Zoom in here" shows. */
const closeUpPeriods = 6

export interface RecordViewerProps {
  run: Run
  columns: readonly Float64Array[]
}

export function RecordViewer({ run, columns }: RecordViewerProps) {
  const { record, modes, figures } = run
  const end = recordEnd(record)
  const period = 1 / (figures.frequency || figures.linearFrequency || Infinity) || null
  const [{ view, cursors, time: placed }, change] = useViewParams(0, end)
  const time = placed ?? 0
  const speeds = speedChoices(period, end)
  const [speed, setSpeed] = useState(() => usualSpeed(speeds, period))
  const [hidden, setHidden] = useState<readonly string[]>(() =>
    record.columns.slice(1).map((column) => column.name),
  )

  const all = useMemo(() => recordSeries(record, columns), [record, columns])
  const series = useMemo(() => all.filter(({ key }) => !hidden.includes(key)), [all, hidden])
  const spans = useMemo(() => limitSpans(modes), [modes])
  const onTime = (wanted: number) => change({ time: wanted, view: follow(view, wanted, end) })
  const playhead = usePlayhead({ modes, end, speed, time, onTime })
  const mode = modeAt(modes, time)

  function closeUp() {
    const width = Math.min(end, closeUpPeriods * (period ?? end / 50))
    const start = Math.max(0, Math.min(time - width / 2, end - width))
    change({ time, view: [start, start + width] })
  }

  /** The last one shown stays: a plot of nothing answers nothing. */
  function toggle(key: string) {
    if (hidden.includes(key)) setHidden(hidden.filter((other) => other !== key))
    else if (series.length > 1) setHidden([...hidden, key])
  }

  return (
    <div className="grid items-start gap-4 lg:grid-cols-[25rem_minmax(0,1fr)]">
      <RunCircuit circuit={run.inputs.circuit} limit={mode} />
      <PlotCard
        className="max-lg:order-first"
        title="Record from power-on"
        keyItems={[...series.map(keyItem), ...limitKeyItems(spans)]}
        table={() => waveformTable(series, record.sampleInterval, view)}
        footer={
          <>
            <PlayheadBar
              {...{ playhead, time, view, mode, speed, speeds }}
              sampleInterval={record.sampleInterval}
              onSpeed={setSpeed}
              onCloseUp={closeUp}
            />
            <div className="border-t border-hair">
              <CursorTable series={series} sampleInterval={record.sampleInterval} cursors={cursors} />
            </div>
          </>
        }
      >
        <fieldset className="flex flex-wrap gap-x-4 px-2">
          <legend className="sr-only">Waveforms shown</legend>
          {all.map(({ key, label }) => (
            <Checkbox key={key} label={label} checked={!hidden.includes(key)} onChange={() => toggle(key)} />
          ))}
        </fieldset>
        <WaveformChart
          label={`Record of ${run.title} from power-on`}
          sampleInterval={record.sampleInterval}
          series={series}
          spans={spans}
          view={view}
          onViewChange={(next) => change({ view: next })}
          cursors={cursors}
          onCursorsChange={(next) => change({ cursors: next })}
          playhead={time}
        />
        <OverviewStrip
          series={all[0]!}
          sampleInterval={record.sampleInterval}
          view={view}
          onViewChange={(next) => change({ view: next })}
        />
        <PlotHints view={view} whole={[0, end]} onViewChange={(next) => change({ view: next })} />
      </PlotCard>
    </div>
  )
}
