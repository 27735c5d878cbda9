/**
 * The one waveform chart: a record over time with zoom, pan, two cursors, limit spans, marks and a playhead. The
 * view and the cursors belong to the caller. `series`, `envelope` and `spans` should keep their identity between
 * renders: a change of identity draws them anew.
 */
import { useId, useRef, useState, type KeyboardEvent } from 'react'
import type {
  Cursors,
  EnvelopeLine,
  LimitSpan,
  TimeMark,
  View,
  WaveformSeries,
} from '#client/components/charts/chart-types.ts'
import { plotFrame, unitsOf } from '#client/components/charts/plot-frame.ts'
import { useWaveformPointer } from '#client/components/charts/use-waveform-pointer.ts'
import { useWidth } from '#client/components/charts/use-width.ts'
import { WaveformCanvas } from '#client/components/charts/waveform-canvas.tsx'
import { keyChange, type ActiveCursor, type ChartChange } from '#client/components/charts/waveform-keys.ts'
import { WaveformOverlay } from '#client/components/charts/waveform-overlay.tsx'
import { formatQuantity } from '#shared/units/format.ts'

export interface WaveformChartProps {
  /** Grid of the record, s. */
  sampleInterval: number
  /** At least one; units beyond the second have no axis. */
  series: readonly WaveformSeries[]
  envelope?: EnvelopeLine
  spans?: readonly LimitSpan[]
  marks?: readonly TimeMark[]
  /** Visible span, s. */
  view: View
  onViewChange: (view: View) => void
  cursors: Cursors
  onCursorsChange: (cursors: Cursors) => void
  /** Instant that a replay shows, s. */
  playhead?: number | null
  /** CSS pixels. */
  height?: number
  /** What the plot shows, for those who cannot see it. */
  label: string
}

const noSpans: readonly LimitSpan[] = []
const noMarks: readonly TimeMark[] = []

/** From power-on to the last sample of the longest series, s. */
export function wholeView(series: readonly WaveformSeries[], sampleInterval: number): View {
  const ends = series.map((one) => (one.values.length - 1) * (one.sampleInterval ?? sampleInterval))
  return [0, Math.max(sampleInterval, ...ends)]
}

/** The visible span and the cursors in words. */
function spoken(view: View, cursors: Cursors, active: ActiveCursor): string {
  const time = (value: number) => formatQuantity(value, 's', { digits: 6 })
  const placed = cursors.map((cursor, i) =>
    cursor === null
      ? ''
      : ` Cursor ${i + 1} at ${time(cursor)}${active === i ? ', moved by the arrow keys' : ''}.`,
  )
  return `Showing ${time(view[0])} to ${time(view[1])}.${placed.join('')}`
}

export function WaveformChart(props: WaveformChartProps) {
  const { sampleInterval, series, envelope, view, cursors, height = 320, label } = props
  const spans = props.spans ?? noSpans
  const container = useRef<HTMLDivElement>(null)
  const area = useRef<HTMLDivElement>(null)
  const width = useWidth(container)
  const help = useId()
  const [active, setActive] = useState<ActiveCursor>(null)
  const state = { view, whole: wholeView(series, sampleInterval), sampleInterval, cursors, active }
  const frame = plotFrame(unitsOf(series))

  function apply(change: ChartChange) {
    if (change.active !== undefined) setActive(change.active)
    if (change.view && (change.view[0] !== view[0] || change.view[1] !== view[1]))
      props.onViewChange(change.view)
    if (change.cursors) props.onCursorsChange(change.cursors)
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.ctrlKey || event.metaKey || event.altKey) return
    const change = keyChange(event.key, event.shiftKey, state)
    if (!change) return
    event.preventDefault()
    apply(change)
  }

  const { selection, handlers } = useWaveformPointer(area, state, apply)
  return (
    <div
      ref={container}
      data-plot
      role="application"
      aria-roledescription="waveform plot"
      aria-label={label}
      aria-describedby={help}
      tabIndex={0}
      onKeyDown={onKeyDown}
      onBlur={() => setActive(null)}
      className="relative w-full min-w-0 rounded focus-visible:outline-2 focus-visible:outline-offset-2 focus-visible:outline-petrol"
      style={{ height }}
    >
      <p id={help} className="sr-only">
        Left and right arrows move the view, plus and minus zoom, 0 shows the whole record. 1 and 2 choose a
        cursor for the arrows to move, with Shift by one sample; Delete removes it, Escape returns to the
        view.
      </p>
      <p className="sr-only" aria-live="polite">
        {spoken(view, cursors, active)}
      </p>
      <WaveformCanvas {...{ width, height, sampleInterval, series, envelope, spans, view }} />
      <div
        ref={area}
        {...handlers}
        className="absolute cursor-crosshair touch-pan-y overflow-hidden select-none"
        style={frame}
        data-testid="plot-area"
      >
        <WaveformOverlay
          {...{ view, cursors, active, selection }}
          marks={props.marks ?? noMarks}
          playhead={props.playhead ?? null}
        />
      </div>
    </div>
  )
}
