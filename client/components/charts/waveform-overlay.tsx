/** What moves above a waveform's canvas: selection, marks, cursors and the playhead. Plain elements, no redraw. */
import type { CSSProperties } from 'react'
import type { Cursors, TimeMark, View } from '#client/components/charts/chart-types.ts'
import { fractionOf } from '#client/components/charts/view-range.ts'
import type { ActiveCursor } from '#client/components/charts/waveform-keys.ts'
import type { Selection } from '#client/components/charts/use-waveform-pointer.ts'

interface OverlayProps {
  view: View
  cursors: Cursors
  active: ActiveCursor
  marks: readonly TimeMark[]
  playhead: number | null
  selection: Selection
}

/** Place of an instant along the plot's area; null when it is out of sight. */
function place(time: number | null, view: View): CSSProperties | null {
  if (time === null) return null
  const fraction = fractionOf(time, view)
  return fraction < 0 || fraction > 1 ? null : { left: `${(fraction * 100).toFixed(4)}%` }
}

/** Beyond this share of the width a label stands to the left of its line. */
const turnLabel = 0.6

function Mark({ mark, view }: { mark: TimeMark; view: View }) {
  const style = place(mark.time, view)
  if (!style) return null
  const left = fractionOf(mark.time, view) > turnLabel
  return (
    <div className="absolute inset-y-0 border-l border-dashed border-ink" style={style}>
      <span
        className={`absolute -top-0.5 rounded bg-card/85 px-1 text-xs whitespace-nowrap text-ink ${left ? 'right-1' : 'left-1'}`}
      >
        {mark.label}
      </span>
    </div>
  )
}

function CursorLine({
  which,
  time,
  view,
  active,
}: {
  which: 0 | 1
  time: number | null
  view: View
  active: boolean
}) {
  const style = place(time, view)
  if (!style) return null
  return (
    <div
      className={`absolute inset-y-0 -ml-px border-l-2 ${which === 0 ? 'border-plum' : 'border-moss'}`}
      style={style}
      data-cursor={which + 1}
    >
      <span
        className={`absolute bottom-0 left-0 -translate-x-1/2 rounded px-1.5 text-xs leading-4 font-medium text-card ${
          which === 0 ? 'bg-plum' : 'bg-moss'
        } ${active ? 'outline-2 outline-offset-1 outline-ink' : ''}`}
      >
        {which + 1}
      </span>
    </div>
  )
}

export function WaveformOverlay({ view, cursors, active, marks, playhead, selection }: OverlayProps) {
  const head = place(playhead, view)
  return (
    <div className="pointer-events-none absolute inset-0" aria-hidden="true">
      {selection && (
        <div
          className="absolute inset-y-0 border-x border-petrol bg-petrol/15"
          style={{ left: `${selection[0] * 100}%`, width: `${(selection[1] - selection[0]) * 100}%` }}
        />
      )}
      {marks.map((mark) => (
        <Mark key={mark.label} mark={mark} view={view} />
      ))}
      <CursorLine which={0} time={cursors[0]} view={view} active={active === 0} />
      <CursorLine which={1} time={cursors[1]} view={view} active={active === 1} />
      {head && <div className="absolute inset-y-0 -ml-px border-l-2 border-ink" style={head} data-playhead />}
    </div>
  )
}
