/** One settled period as plot series. */
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'
import { columnLooks } from '#client/components/charts/column-looks.ts'
import type { SettledTone } from '#sim/types.ts'

export interface OnePeriod {
  /** s. */
  sampleInterval: number
  series: WaveformSeries[]
}

/** The period's samples and, to close it, the first one again. */
function closed(values: Float64Array): Float64Array {
  const all = new Float64Array(values.length + 1)
  all.set(values)
  all[values.length] = values[0] ?? 0
  return all
}

export function onePeriod({ waveform, frequency }: SettledTone): OnePeriod {
  return {
    sampleInterval: 1 / (frequency * waveform.vo.length),
    series: [
      { key: 'vo', label: 'output', unit: 'V', values: closed(waveform.vo), ...columnLooks.output },
      {
        key: 'v1',
        label: 'network node',
        unit: 'V',
        values: closed(waveform.v1),
        ...columnLooks.networkNode,
      },
    ],
  }
}
