/** The whole record at a glance, with a window on the visible span: drag it or its edges, or use the arrow keys. */
import { useMemo, useRef, type KeyboardEvent, type PointerEvent } from 'react'
import type { View, WaveformSeries } from '#client/components/charts/chart-types.ts'
import { drawnGrid } from '#client/components/charts/decimate.ts'
import { plotFrame, valueRange } from '#client/components/charts/plot-frame.ts'
import { useWidth } from '#client/components/charts/use-width.ts'
import { clampView, fractionOf, leastSpan, panView, timeAt } from '#client/components/charts/view-range.ts'
import { formatQuantity } from '#shared/units/format.ts'

export interface OverviewStripProps {
  /** The series that is drawn; the strip spans all of it. */
  series: WaveformSeries
  /** Grid of the record, s. */
  sampleInterval: number
  view: View
  onViewChange: (view: View) => void
}

const height = 44
/** Share of the record that an arrow key moves by; Shift is a tenth of it. */
const keyShare = 0.02

type Part = 'window' | 'start' | 'end'

const partNames: Record<Part, string> = {
  window: 'Visible span',
  start: 'Start of the visible span',
  end: 'End of the visible span',
}

/** `view` with one part of it moved by `shift` seconds. */
export function movedPart(part: Part, view: View, shift: number, whole: View, least: number): View {
  if (part === 'window') return panView(view, shift, whole)
  if (part === 'start') return [Math.min(view[1] - least, Math.max(whole[0], view[0] + shift)), view[1]]
  return [view[0], Math.max(view[0] + least, Math.min(whole[1], view[1] + shift))]
}

function path(series: WaveformSeries, sampleInterval: number, whole: View, width: number): string {
  if (width === 0) return ''
  const line = drawnGrid(series.values, series.sampleInterval ?? sampleInterval, ...whole, width)
  const [low, high] = valueRange([line.value])
  return Array.from(line.time, (time, i) => {
    const x = fractionOf(time, whole) * width
    const y = height * (1 - (line.value[i]! - low) / (high - low))
    return `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`
  }).join('')
}

export function OverviewStrip({ series, sampleInterval, view, onViewChange }: OverviewStripProps) {
  const track = useRef<HTMLDivElement>(null)
  const grip = useRef<{ part: Part; x: number; view: View } | null>(null)
  const width = useWidth(track)
  const interval = series.sampleInterval ?? sampleInterval
  const end = (series.values.length - 1) * interval
  const whole = useMemo((): View => [0, end], [end])
  const least = leastSpan(interval)
  const drawing = useMemo(
    () => path(series, sampleInterval, whole, width),
    [series, sampleInterval, whole, width],
  )
  const frame = plotFrame([series.unit])
  const left = Math.max(0, fractionOf(view[0], whole)) * 100
  const right = Math.min(1, fractionOf(view[1], whole)) * 100

  const move = (part: Part, from: View, shift: number) =>
    onViewChange(movedPart(part, from, shift, whole, least))
  const handlers = (part: Part) => ({
    onPointerDown(event: PointerEvent) {
      event.stopPropagation()
      event.currentTarget.setPointerCapture?.(event.pointerId)
      grip.current = { part, x: event.clientX, view }
    },
    onPointerMove(event: PointerEvent) {
      if (!grip.current || width === 0) return
      move(grip.current.part, grip.current.view, ((event.clientX - grip.current.x) / width) * end)
    },
    onPointerUp: () => (grip.current = null),
    onPointerCancel: () => (grip.current = null),
    onKeyDown(event: KeyboardEvent) {
      const direction = { ArrowLeft: -1, ArrowDown: -1, ArrowRight: 1, ArrowUp: 1 }[event.key]
      if (!direction) return
      event.preventDefault()
      move(part, view, direction * end * keyShare * (event.shiftKey ? 0.1 : 1))
    },
    role: 'slider',
    tabIndex: 0,
    'aria-label': partNames[part],
    'aria-valuemin': 0,
    'aria-valuemax': end,
    'aria-valuenow': part === 'end' ? view[1] : view[0],
    'aria-valuetext':
      part === 'window'
        ? `${formatQuantity(view[0], 's')} to ${formatQuantity(view[1], 's')}`
        : formatQuantity(part === 'end' ? view[1] : view[0], 's'),
  })

  /** A press outside the window brings it there. */
  function centreAt(event: PointerEvent) {
    if (!track.current) return
    const box = track.current.getBoundingClientRect()
    const centre = timeAt((event.clientX - box.left) / (box.width || 1), whole)
    const half = (view[1] - view[0]) / 2
    onViewChange(clampView([centre - half, centre + half], whole, least))
  }

  const edge = 'absolute inset-y-0 w-6 cursor-ew-resize touch-none'
  return (
    <div style={{ paddingLeft: frame.left, paddingRight: frame.right }}>
      <div
        ref={track}
        onPointerDown={centreAt}
        className="relative min-w-0 rounded bg-sunk"
        style={{ height }}
      >
        <svg width={width} height={height} className="block text-faint" aria-hidden="true">
          <path d={drawing} fill="none" stroke="currentColor" strokeWidth="0.8" />
        </svg>
        <div className="absolute inset-y-0" style={{ left: `${left}%`, width: `max(4px, ${right - left}%)` }}>
          <div
            {...handlers('window')}
            className="absolute inset-0 cursor-grab touch-none rounded border border-petrol bg-petrol/10 active:cursor-grabbing"
          />
          <div {...handlers('start')} className={`${edge} -left-3`}>
            <span className="absolute inset-y-2.5 left-1/2 w-1 -translate-x-1/2 rounded bg-petrol" />
          </div>
          <div {...handlers('end')} className={`${edge} -right-3`}>
            <span className="absolute inset-y-2.5 left-1/2 w-1 -translate-x-1/2 rounded bg-petrol" />
          </div>
        </div>
      </div>
    </div>
  )
}
