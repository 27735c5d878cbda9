/** The whole record at a glance, with a window on the visible span: drag it or its edges, or use the arrow keys. */
import { useMemo, useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react'
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

interface StripPartProps {
  part: Part
  view: View
  whole: View
  least: number
  /** Of the strip, CSS pixels. */
  width: number
  onViewChange: (view: View) => void
  className: string
  children?: ReactNode
}

/** The window or one of its edges: a slider for pointer and arrow keys. */
function StripPart({ part, view, whole, least, width, onViewChange, className, children }: StripPartProps) {
  const grip = useRef<{ x: number; view: View } | null>(null)
  const span = whole[1] - whole[0]
  const move = (from: View, shift: number) => onViewChange(movedPart(part, from, shift, whole, least))
  const letGo = () => {
    grip.current = null
  }

  function onPointerDown(event: PointerEvent) {
    event.stopPropagation()
    event.currentTarget.setPointerCapture?.(event.pointerId)
    grip.current = { x: event.clientX, view }
  }

  function onPointerMove(event: PointerEvent) {
    if (grip.current && width > 0) move(grip.current.view, ((event.clientX - grip.current.x) / width) * span)
  }

  function onKeyDown(event: KeyboardEvent) {
    const direction = { ArrowLeft: -1, ArrowDown: -1, ArrowRight: 1, ArrowUp: 1 }[event.key]
    if (!direction) return
    event.preventDefault()
    move(view, direction * span * keyShare * (event.shiftKey ? 0.1 : 1))
  }

  const value = part === 'end' ? view[1] : view[0]
  const text = (time: number) => formatQuantity(time, 's')
  return (
    <div
      {...{ onPointerDown, onPointerMove, onKeyDown }}
      onPointerUp={letGo}
      onPointerCancel={letGo}
      role="slider"
      tabIndex={0}
      aria-label={partNames[part]}
      aria-valuemin={whole[0]}
      aria-valuemax={whole[1]}
      aria-valuenow={value}
      aria-valuetext={part === 'window' ? `${text(view[0])} to ${text(view[1])}` : text(value)}
      className={`touch-none ${className}`}
    >
      {children}
    </div>
  )
}

export function OverviewStrip({ series, sampleInterval, view, onViewChange }: OverviewStripProps) {
  const track = useRef<HTMLDivElement>(null)
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

  /** A press outside the window brings it there. */
  function centreAt(event: PointerEvent) {
    if (!track.current) return
    const box = track.current.getBoundingClientRect()
    const centre = timeAt((event.clientX - box.left) / (box.width || 1), whole)
    const half = (view[1] - view[0]) / 2
    onViewChange(clampView([centre - half, centre + half], whole, least))
  }

  const part = { view, whole, least, width, onViewChange }
  const edge = 'absolute inset-y-0 w-6 cursor-ew-resize'
  const handle = <span className="absolute inset-y-2.5 left-1/2 w-1 -translate-x-1/2 rounded bg-petrol" />
  return (
    <div data-print="hidden" style={{ paddingLeft: frame.left, paddingRight: frame.right }}>
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
          <StripPart
            {...part}
            part="window"
            className="absolute inset-0 cursor-grab rounded border border-petrol bg-petrol/10 active:cursor-grabbing"
          />
          <StripPart {...part} part="start" className={`${edge} -left-3`}>
            {handle}
          </StripPart>
          <StripPart {...part} part="end" className={`${edge} -right-3`}>
            {handle}
          </StripPart>
        </div>
      </div>
    </div>
  )
}
