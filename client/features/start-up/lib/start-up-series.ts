/** The series of the start-up plot out of a record. */
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'
import { columnLooks } from '#client/components/charts/column-looks.ts'
import type { Simulation } from '#sim/types.ts'

/** Series besides the output that a person may add. */
export interface SeriesChoice {
  node: boolean
  control: boolean
}

/**
 * Output, then the network node and the amplitude control's own state where they are chosen and exist.
 * @param lift what is added to every voltage, V: the reference, where volts are shown from the negative rail
 */
export function startUpSeries(
  { vo, v1, control }: Simulation,
  choice: SeriesChoice,
  lift = 0,
): WaveformSeries[] {
  const lifted = (volts: Float64Array) => (lift === 0 ? volts : volts.map((value) => value + lift))
  const series: WaveformSeries[] = [
    { key: 'vo', label: 'output', unit: 'V', values: lifted(vo), ...columnLooks.output },
  ]
  if (choice.node)
    series.push({
      key: 'v1',
      label: 'network node',
      unit: 'V',
      values: lifted(v1),
      ...columnLooks.networkNode,
    })
  if (choice.control && control)
    series.push({
      key: 'control',
      label: control.name,
      unit: control.unit,
      values: control.values,
      ...columnLooks.control,
    })
  return series
}
