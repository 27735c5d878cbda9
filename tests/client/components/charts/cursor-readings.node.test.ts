import { describe, expect, it } from 'vitest'
import { cursorReadings, valueAt } from '#client/components/charts/cursor-readings.ts'
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'

// Against the closed form 3 sin(2π·1000·t); a straight line between samples h apart errs by at most A(ωh)²/8.
const amplitude = 3
const omega = 2 * Math.PI * 1000
const step = 1e-6
const sine = (time: number) => amplitude * Math.sin(omega * time)
const values = Float64Array.from({ length: 10_001 }, (_, i) => sine(i * step))
const bound = (amplitude * (omega * step) ** 2) / 8
const series: WaveformSeries[] = [{ key: 'vo', label: 'output', unit: 'V', values, color: 'petrol' }]

describe('valueAt', () => {
  it('reads a sine between its samples to the error of a straight line', () => {
    for (const time of [0, 1.23456e-3, 5.0000005e-3, 9.9999e-3, 10e-3])
      expect(Math.abs(valueAt(values, step, time)! - sine(time))).toBeLessThanOrEqual(bound + 1e-12)
  })

  it('reads nothing outside the record', () => {
    expect(valueAt(values, step, -1e-9)).toBeNull()
    expect(valueAt(values, step, 10.1e-3)).toBeNull()
    expect(valueAt(new Float64Array(), step, 0)).toBeNull()
  })
})

describe('cursorReadings', () => {
  it('gives Δt, 1/Δt and ΔV of a sine: a quarter period apart, from zero to peak', () => {
    const readings = cursorReadings(series, step, [2e-3, 2.25e-3])
    expect(readings.interval).toBeCloseTo(0.25e-3, 12)
    expect(readings.frequency).toBeCloseTo(4000, 6)
    expect(readings.series[0]!.first).toBeCloseTo(0, 9)
    expect(readings.series[0]!.difference).toBeCloseTo(amplitude, 9)
  })

  it('reads one period apart as the frequency, also backwards in time', () => {
    const readings = cursorReadings(series, step, [3.1e-3, 2.1e-3])
    expect(readings.interval).toBeCloseTo(-1e-3, 12)
    expect(readings.frequency).toBeCloseTo(1000, 6)
    expect(readings.series[0]!.difference).toBeCloseTo(0, 9)
  })

  it('has no frequency while cursors coincide, and no differences while one is missing', () => {
    expect(cursorReadings(series, step, [1e-3, 1e-3]).frequency).toBeNull()
    const readings = cursorReadings(series, step, [1e-3, null])
    expect(readings.interval).toBeNull()
    expect(readings.series[0]).toMatchObject({ second: null, difference: null })
  })

  it('reads a series on its own grid', () => {
    const coarse = { ...series[0]!, values: Float64Array.of(0, 10, 20), sampleInterval: 5e-3 }
    expect(cursorReadings([coarse], step, [2.5e-3, 10e-3]).series[0]).toMatchObject({ first: 5, second: 20 })
  })
})
