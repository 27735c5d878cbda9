/**
 * What the pointer does on a waveform chart: drag selects a span to zoom to, shift-drag, middle-drag or a finger
 * pans, a drag on a cursor moves it, a click places one, the wheel zooms about the pointer, a double click shows the
 * whole record. The wheel is left to the page where the chart has nothing more to show.
 */
import { useEffect, useRef, useState, type MouseEvent, type PointerEvent, type RefObject } from 'react'
import type { Cursors, View } from '#client/components/charts/chart-types.ts'
import {
  clampView,
  fractionOf,
  leastSpan,
  panView,
  timeAt,
  zoomView,
} from '#client/components/charts/view-range.ts'
import {
  placedCursor,
  withCursor,
  type ChartChange,
  type ChartState,
} from '#client/components/charts/waveform-keys.ts'

/** Pixels that a drag must exceed to be one, and within which a cursor is caught. */
const dragThreshold = 4
const catchDistance = 8
/** Zoom per wheel pixel: a notch of 100 px shows 4/5 of the span. */
const wheelZoom = Math.log(1.25) / 100

type Drag = { startX: number; moved: boolean; view: View } & (
  { kind: 'select' | 'pan' } | { kind: 'cursor'; which: 0 | 1 }
)

/** Selection under way as fractions of the view, ascending; null while there is none. */
export type Selection = [number, number] | null

export function useWaveformPointer(
  area: RefObject<HTMLDivElement | null>,
  state: ChartState,
  change: (change: ChartChange) => void,
) {
  const drag = useRef<Drag | null>(null)
  const dragged = useRef(false)
  const beforeClick = useRef<Cursors>(state.cursors)
  const [selection, setSelection] = useState<Selection>(null)

  const width = () => area.current?.getBoundingClientRect().width || 1
  const fraction = (clientX: number) => {
    const left = area.current?.getBoundingClientRect().left ?? 0
    return Math.min(1, Math.max(0, (clientX - left) / width()))
  }

  function caughtCursor(clientX: number): 0 | 1 | null {
    const distance = (time: number | null) =>
      time === null ? Infinity : Math.abs(fractionOf(time, state.view) - fraction(clientX)) * width()
    const [first, second] = [distance(state.cursors[0]), distance(state.cursors[1])]
    if (Math.min(first, second) > catchDistance) return null
    return first <= second ? 0 : 1
  }

  function onPointerDown(event: PointerEvent) {
    if (event.button > 1) return
    event.currentTarget.setPointerCapture?.(event.pointerId)
    dragged.current = false
    const begin = { startX: event.clientX, moved: false, view: state.view }
    const caught = event.button === 0 && !event.shiftKey ? caughtCursor(event.clientX) : null
    if (caught !== null) drag.current = { ...begin, kind: 'cursor', which: caught }
    else {
      const pans = event.button === 1 || event.shiftKey || event.pointerType === 'touch'
      drag.current = { ...begin, kind: pans ? 'pan' : 'select' }
    }
    if (event.button === 1) event.preventDefault()
  }

  function onPointerMove(event: PointerEvent) {
    const current = drag.current
    if (!current) return
    const distance = event.clientX - current.startX
    if (!current.moved && Math.abs(distance) < dragThreshold) return
    current.moved = true
    dragged.current = true
    if (current.kind === 'cursor') {
      change({
        cursors: withCursor(state.cursors, current.which, timeAt(fraction(event.clientX), state.view)),
      })
    } else if (current.kind === 'select') {
      const ends = [fraction(current.startX), fraction(event.clientX)]
      setSelection([Math.min(...ends), Math.max(...ends)])
    } else {
      const shift = (-distance / width()) * (current.view[1] - current.view[0])
      change({ view: panView(current.view, shift, state.whole) })
    }
  }

  /** Reads the event, not `selection`: the latest move may not have been rendered yet. */
  function onPointerUp(event: PointerEvent) {
    const current = drag.current
    if (current?.kind === 'select' && current.moved) {
      const ends = [fraction(current.startX), fraction(event.clientX)]
      const [from, to] = [timeAt(Math.min(...ends), state.view), timeAt(Math.max(...ends), state.view)]
      change({ view: clampView([from, to], state.whole, leastSpan(state.sampleInterval)) })
    }
    cancel()
  }

  function cancel() {
    drag.current = null
    setSelection(null)
  }

  function onClick(event: MouseEvent) {
    if (dragged.current || event.detail > 1 || event.shiftKey) return
    beforeClick.current = state.cursors
    change({
      cursors: placedCursor(state.cursors, state.active, timeAt(fraction(event.clientX), state.view)),
    })
  }

  /** The first click of a double click has placed a cursor: it is put back. */
  function onDoubleClick() {
    change({ view: state.whole, cursors: beforeClick.current })
  }

  function wheel(event: WheelEvent, view: View): View | null {
    const { whole, sampleInterval } = state
    const span = view[1] - view[0]
    const sideways = Math.abs(event.deltaX) > Math.abs(event.deltaY)
    const next = sideways
      ? panView(view, (event.deltaX / width()) * span, whole)
      : zoomView(
          view,
          Math.exp(event.deltaY * wheelZoom),
          timeAt(fraction(event.clientX), view),
          whole,
          leastSpan(sampleInterval),
        )
    if (next[0] === view[0] && next[1] === view[1]) return null
    event.preventDefault()
    change({ view: next })
    return next
  }

  // Several turns of the wheel may come between two renders: each goes on from the one before.
  const wheelFrom = useRef(state.view)
  const latestWheel = useRef(wheel)
  useEffect(() => {
    latestWheel.current = wheel
    wheelFrom.current = state.view
  })
  // React listens to the wheel passively: a zoom must keep the page from scrolling.
  useEffect(() => {
    const element = area.current
    const listener = (event: WheelEvent) => {
      wheelFrom.current = latestWheel.current(event, wheelFrom.current) ?? wheelFrom.current
    }
    element?.addEventListener('wheel', listener, { passive: false })
    return () => element?.removeEventListener('wheel', listener)
  }, [area])

  const handlers = {
    onPointerDown,
    onPointerMove,
    onPointerUp,
    onPointerCancel: cancel,
    onClick,
    onDoubleClick,
  }
  return { selection, handlers }
}
