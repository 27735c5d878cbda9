/** A stored record's columns as the plots take them. */
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'
import type { KeyItem } from '#client/components/charts/plot-card.tsx'
import type { RecordLayout } from '#shared/schemas/run.ts'

/** Colour and dash of each column in the order in which a run stores them, the same on every page. */
const looks: Pick<WaveformSeries, 'color' | 'dash'>[] = [
  { color: 'petrol' },
  { color: 'plum', dash: [6, 3] },
  { color: 'moss', dash: [2, 3] },
  { color: 'slate', dash: [8, 3, 2, 3] },
]

/** Every column as a series. Throws a RangeError when record and layout do not belong together. */
export function recordSeries(layout: RecordLayout, columns: readonly Float64Array[]): WaveformSeries[] {
  return layout.columns.map(({ name, unit }, index) => {
    const values = columns[index]
    if (!values) throw new RangeError(`the record has no column for ${name}`)
    return { key: name, label: name, unit, values, ...looks[index % looks.length]! }
  })
}

/** The series in the plot's key. */
export const keyItem = ({ label, color, dash }: WaveformSeries): KeyItem => ({
  label,
  sign: color,
  dashed: dash !== undefined,
})

/** Last instant of a record, s. */
export const recordEnd = ({ samples, sampleInterval }: RecordLayout) => (samples - 1) * sampleInterval
