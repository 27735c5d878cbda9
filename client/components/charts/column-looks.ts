/** How the columns of a record look, the same on every page, and how lines and washes stand in a plot's key. */
import type { LimitSpan, WaveformSeries } from '#client/components/charts/chart-types.ts'
import type { KeyItem } from '#client/components/charts/plot-card.tsx'

export type ColumnLook = Pick<WaveformSeries, 'color' | 'dash'>

/** By what a column holds; `control` is the amplitude control's own state. */
export const columnLooks = {
  output: { color: 'petrol' },
  networkNode: { color: 'plum', dash: [5, 3] },
  seriesCapacitor: { color: 'moss', dash: [2, 3] },
  control: { color: 'slate', dash: [8, 3, 2, 3] },
} satisfies Record<string, ColumnLook>

/** A series in the plot's key. */
export const keyItem = ({ label, color, dash }: WaveformSeries): KeyItem => ({
  label,
  sign: color,
  dashed: dash !== undefined,
})

/** The washes that the spans paint, each once. */
export function limitKeyItems(spans: readonly LimitSpan[]): KeyItem[] {
  const items: KeyItem[] = [
    { label: 'held at a rail', sign: 'held' },
    { label: 'slewing', sign: 'slew' },
  ]
  return items.filter(({ sign }) => spans.some(({ kind }) => kind === sign))
}
