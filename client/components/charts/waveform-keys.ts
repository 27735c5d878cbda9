/** What a key does on a waveform chart, as a pure function of the chart's state. */
import type { Cursors, View } from '#client/components/charts/chart-types.ts'
import { leastSpan, panView, viewContaining, zoomView } from '#client/components/charts/view-range.ts'

/** The cursor that the arrow keys move; null while they move the view. */
export type ActiveCursor = 0 | 1 | null

export interface ChartState {
  view: View
  whole: View
  sampleInterval: number
  cursors: Cursors
  active: ActiveCursor
}

/** What is to change; members left out stay. */
export interface ChartChange {
  view?: View
  cursors?: Cursors
  active?: ActiveCursor
}

/** Shares of the view that one arrow key moves by: the view itself, and a cursor. */
const panShare = 0.1
const cursorShare = 1 / 200
const zoomFactor = 0.5

/** `cursors` with one of them set. */
export function withCursor(cursors: Cursors, which: 0 | 1, time: number | null): Cursors {
  return which === 0 ? [time, cursors[1]] : [cursors[0], time]
}

/** The cursor that a click at `time` sets: the active one, else one not placed yet, else the nearer. */
export function placedCursor(cursors: Cursors, active: ActiveCursor, time: number): Cursors {
  if (active !== null) return withCursor(cursors, active, time)
  const [first, second] = cursors
  if (first === null) return withCursor(cursors, 0, time)
  if (second === null) return withCursor(cursors, 1, time)
  return withCursor(cursors, Math.abs(first - time) <= Math.abs(second - time) ? 0 : 1, time)
}

function activated(state: ChartState, which: 0 | 1): ChartChange {
  const { view, cursors } = state
  const time = cursors[which]
  if (time !== null) return { active: which, view: viewContaining(view, time, state.whole) }
  return { active: which, cursors: withCursor(cursors, which, (view[0] + view[1]) / 2) }
}

/** An arrow key: moves the active cursor (`fine`: by one sample), or the view (`fine`: by a hundredth). */
function moved(state: ChartState, direction: 1 | -1, fine: boolean): ChartChange {
  const { view, whole, cursors, active, sampleInterval } = state
  const span = view[1] - view[0]
  if (active === null)
    return { view: panView(view, direction * span * (fine ? panShare / 10 : panShare), whole) }
  const step = fine ? sampleInterval : Math.max(sampleInterval, span * cursorShare)
  const from = cursors[active] ?? (view[0] + view[1]) / 2
  const time = Math.min(whole[1], Math.max(whole[0], from + direction * step))
  return { cursors: withCursor(cursors, active, time), view: viewContaining(view, time, whole) }
}

function zoomed(state: ChartState, factor: number): ChartChange {
  const { view, whole, cursors, active } = state
  const about = (active === null ? null : cursors[active]) ?? (view[0] + view[1]) / 2
  return { view: zoomView(view, factor, about, whole, leastSpan(state.sampleInterval)) }
}

/** The change that a key makes; null when the key means nothing here and the page should have it. */
export function keyChange(key: string, shift: boolean, state: ChartState): ChartChange | null {
  const { view, whole, cursors, active } = state
  switch (key) {
    case '1':
      return activated(state, 0)
    case '2':
      return activated(state, 1)
    case 'Escape':
      return active === null ? null : { active: null }
    case 'Delete':
    case 'Backspace':
      return active === null ? null : { cursors: withCursor(cursors, active, null), active: null }
    case 'ArrowLeft':
      return moved(state, -1, shift)
    case 'ArrowRight':
      return moved(state, 1, shift)
    case '+':
    case '=':
      return zoomed(state, zoomFactor)
    case '-':
    case '_':
      return zoomed(state, 1 / zoomFactor)
    case '0':
      return { view: whole }
    case 'Home':
      return { view: panView(view, whole[0] - whole[1], whole) }
    case 'End':
      return { view: panView(view, whole[1] - whole[0], whole) }
    default:
      return null
  }
}
