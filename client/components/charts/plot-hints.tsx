import type { View } from '#client/components/charts/chart-types.ts'
import { Button } from '#client/components/ui/button.tsx'

export interface PlotHintsProps {
  view: View
  whole: View
  /** What the button shows again. */
  wholeName?: string
  /** Whether an overview strip lies below the plot; fingers zoom there. */
  strip?: boolean
  onViewChange: (view: View) => void
}

/** How the plot above is handled, by mouse or by finger, and the way back to the whole record. */
export function PlotHints(props: PlotHintsProps) {
  const { view, whole, wholeName = 'Whole record', strip = true, onViewChange } = props
  const isWhole = view[0] <= whole[0] && view[1] >= whole[1]
  return (
    <div
      data-print="hidden"
      className="ml-auto flex flex-wrap items-center justify-end gap-x-4 text-sm text-soft"
    >
      <span className="pointer-coarse:hidden">
        Drag to zoom, click to place a cursor, Shift-drag to move.
      </span>
      <span className="hidden pointer-coarse:inline">
        {strip
          ? 'Drag to move, tap to place a cursor, drag the strip’s edges to zoom.'
          : 'Drag to move, tap to place a cursor.'}
      </span>
      <Button variant="quiet" disabled={isWhole} onClick={() => onViewChange(whole)}>
        {wholeName}
      </Button>
    </div>
  )
}
