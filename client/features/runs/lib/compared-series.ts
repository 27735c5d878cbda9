import type { WaveformSeries } from '#client/components/charts/chart-types.ts'
import type { Run } from '#shared/schemas/run.ts'

/** A run with its record. */
export interface Side {
  run: Run
  columns: readonly Float64Array[]
}

/** Colour and dash tell the two apart, whatever the theme or the printer. */
const looks = {
  A: { color: 'petrol' },
  B: { color: 'copper', dash: [6, 4] },
} as const

function sideSeries(letter: 'A' | 'B', { run, columns }: Side, name: string): WaveformSeries {
  const index = run.record.columns.findIndex((column) => column.name === name)
  const values = columns[index]
  if (!values) throw new RangeError(`run ${run.id} has no column for ${name}`)
  const { color, ...rest } = looks[letter]
  return {
    key: letter,
    label: `${letter}: ${run.title}`,
    unit: run.record.columns[index]!.unit,
    values,
    color,
    dash: 'dash' in rest ? [...rest.dash] : undefined,
    sampleInterval: run.record.sampleInterval,
  }
}

/** The same column of two runs, each on its own grid from power-on. */
export function comparedSeries(a: Side, b: Side, name: string): [WaveformSeries, WaveformSeries] {
  return [sideSeries('A', a, name), sideSeries('B', b, name)]
}
