import type { View } from '#client/components/charts/chart-types.ts'
import { Button } from '#client/components/ui/button.tsx'

export interface PlotHintsProps {
  view: View
  /** Last instant of the record, s. */
  end: number
  onViewChange: (view: View) => void
}

/** How the plot above is handled, by mouse or by finger, and the way back to the whole record. */
export function PlotHints({ view, end, onViewChange }: PlotHintsProps) {
  const isWhole = view[0] <= 0 && view[1] >= end
  return (
    <div
      data-print="hidden"
      className="ml-auto flex flex-wrap items-center justify-end gap-x-4 text-sm text-soft"
    >
      <span className="pointer-coarse:hidden">
        Drag to zoom, click to place a cursor, Shift-drag to move.
      </span>
      <span className="hidden pointer-coarse:inline">
        Drag to move, tap to place a cursor, drag the strip’s edges to zoom.
      </span>
      <Button variant="quiet" disabled={isWhole} onClick={() => onViewChange([0, end])}>
        Whole record
      </Button>
    </div>
  )
}
