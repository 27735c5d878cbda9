import { describe, expect, it } from 'vitest'
import { mostRows, waveformTable } from '#client/components/charts/plot-table.ts'
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'

const ramp: WaveformSeries = {
  key: 'vo',
  label: 'output',
  unit: 'V',
  values: Float64Array.from({ length: 30_001 }, (_, i) => i * 1e-3),
  color: 'petrol',
}

describe('waveformTable', () => {
  it('lists a short span sample by sample', () => {
    const { columns, rows, note } = waveformTable([ramp], 2e-6, [0, 10e-6])
    expect(columns).toEqual(['time', 'output'])
    expect(rows).toHaveLength(6)
    expect(rows[2]).toEqual(['4\u2009µs', '2\u2009mV'])
    expect(note).toBe('All 6 samples of the visible span.')
  })

  it('thins a long span evenly and says how', () => {
    const { rows, note } = waveformTable([ramp], 2e-6, [0, 60e-3])
    expect(rows.length).toBeLessThanOrEqual(mostRows)
    expect(note).toBe('Every 301st of the 30,001 samples of the visible span; the CSV file has them all.')
    expect(rows[1]![1]).toBe('301\u2009mV')
  })
})
