/** What the plots of this folder exchange. Times in seconds from power-on, values in SI units. */
import type { ChartColour } from '#client/components/charts/chart-colours.ts'

export type { Cursors, View } from '#client/lib/view-params.ts'

/** A column of a record on a uniform grid that begins at power-on. */
export interface WaveformSeries {
  key: string
  label: string
  unit: string
  values: Float64Array
  color: ChartColour
  /** Lengths of dash and gap in CSS pixels; solid when left out. */
  dash?: number[]
  /** This series' own grid where it differs from the chart's. */
  sampleInterval?: number
}

/** Successive maxima of the magnitude, joined by straight lines. */
export interface EnvelopeLine {
  time: Float64Array
  value: Float64Array
}

/** A stretch during which a limit of the amplifier governs the output. */
export interface LimitSpan {
  kind: 'held' | 'slew'
  start: number
  end: number
}

/** A vertical mark with its own label, as where 90 % is reached. */
export interface TimeMark {
  time: number
  label: string
}
