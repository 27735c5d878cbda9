/** A stored record's columns as the plots take them. */
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'
import { columnLooks, type ColumnLook } from '#client/components/charts/column-looks.ts'
import type { RecordLayout } from '#shared/schemas/run.ts'

/** In the order in which a run stores its columns. */
const { output, networkNode, seriesCapacitor, control } = columnLooks
const looks: readonly ColumnLook[] = [output, networkNode, seriesCapacitor, control]

/** Every column as a series. Throws a RangeError when record and layout do not belong together. */
export function recordSeries(layout: RecordLayout, columns: readonly Float64Array[]): WaveformSeries[] {
  return layout.columns.map(({ name, unit }, index) => {
    const values = columns[index]
    if (!values) throw new RangeError(`the record has no column for ${name}`)
    return { key: name, label: name, unit, values, ...looks[index % looks.length]! }
  })
}

/** Last instant of a record, s. */
export const recordEnd = ({ samples, sampleInterval }: RecordLayout) => (samples - 1) * sampleInterval
