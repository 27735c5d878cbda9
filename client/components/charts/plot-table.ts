/** The numbers behind a waveform as a short table: the visible span, evenly thinned where it is long. */
import type { View, WaveformSeries } from '#client/components/charts/chart-types.ts'
import { valueAt } from '#client/components/charts/cursor-readings.ts'
import { samplesWithin } from '#client/components/charts/decimate.ts'
import { formatCount, formatQuantity } from '#shared/units/format.ts'

export interface PlotTable {
  columns: string[]
  /** Texts, one per column. */
  rows: string[][]
  /** What the rows are of. */
  note: string
}

/** Most rows of one table. */
export const mostRows = 100

/** English ending of an ordinal: 1st, 2nd, 3rd, 4th, 11th. */
const ordinalEnd = (n: number) => {
  const tens = n % 100
  if (tens > 10 && tens < 14) return 'th'
  return ['th', 'st', 'nd', 'rd'][n % 10] ?? 'th'
}

/** @param sampleInterval grid of the rows, s; series on another grid are read between their samples */
export function waveformTable(
  series: readonly WaveformSeries[],
  sampleInterval: number,
  view: View,
): PlotTable {
  const samples = Math.max(0, ...series.map((one) => one.values.length))
  const range = samplesWithin(samples, sampleInterval, ...view)
  const within = range.last - range.first + 1
  const step = Math.max(1, Math.ceil(within / mostRows))
  const rows: string[][] = []
  for (let i = range.first; i <= range.last; i += step) {
    const time = i * sampleInterval
    rows.push([
      formatQuantity(time, 's', { digits: 7 }),
      ...series.map((one) => {
        const value = valueAt(one.values, one.sampleInterval ?? sampleInterval, time)
        return value === null ? '–' : formatQuantity(value, one.unit, { digits: 5 })
      }),
    ])
  }
  const note =
    step === 1
      ? `All ${formatCount(within)} samples of the visible span.`
      : `Every ${step}${ordinalEnd(step)} of the ${formatCount(within)} samples of the visible span; the CSV file has them all.`
  return { columns: ['time', ...series.map((one) => one.label)], rows, note }
}
