import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { spanCsv } from '#client/components/charts/span-csv.ts'
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'

const step = 2e-6
const sine = Float64Array.from({ length: 50_001 }, (_, i) => 7.5 * Math.sin(i * 0.0123))
const series: WaveformSeries[] = [
  { key: 'vo', label: 'output', unit: 'V', values: sine, color: 'petrol' },
  { key: 'v1', label: 'node, "quiet"', unit: 'V', values: sine.map((value) => value / 3), color: 'plum' },
]

async function parsed(view: readonly [number, number]) {
  const { data, errors } = Papa.parse<string[]>((await spanCsv(series, step, view)).join(''), {
    skipEmptyLines: true,
  })
  expect(errors).toEqual([])
  const [header, ...rows] = data
  return { header, rows }
}

describe('spanCsv', () => {
  it('reads back as it was written, to the last bit', async () => {
    const { header, rows } = await parsed([0, 0.1])
    expect(header).toEqual(['time (s)', 'output (V)', 'node, "quiet" (V)'])
    expect(rows).toHaveLength(50_001)
    for (const i of [0, 1, 19_999, 20_000, 20_001, 50_000]) {
      expect(rows[i]!.slice(1).map(Number)).toEqual([sine[i], sine[i]! / 3])
      expect(Number(rows[i]![0])).toBeCloseTo(i * step, 12)
    }
  })

  it('holds the samples of the visible span, both edges included', async () => {
    const { rows } = await parsed([0.002, 0.003])
    expect(rows).toHaveLength(501)
    expect([rows[0]![0], rows.at(-1)![0]]).toEqual(['0.002', '0.003'])
  })
})
