import { describe, expect, it } from 'vitest'
import { analysePair, totalHarmonicDistortion } from '#sim/spectrum/harmonics.ts'

const n = 256
const sampled = (wave: (angle: number) => number) =>
  Float64Array.from({ length: n }, (_, index) => wave((2 * Math.PI * index) / n))

describe('analysePair', () => {
  it('returns magnitude and phase of each signal by itself', () => {
    const a = sampled((x) => 0.5 + 3 * Math.cos(x - 0.4) + 0.2 * Math.sin(5 * x))
    const b = sampled((x) => -1 + 2 * Math.sin(x) + 0.1 * Math.cos(2 * x + 1))
    const [first, second] = analysePair(a, b, 6)
    expect(first.mean).toBeCloseTo(0.5, 14)
    expect(first.harmonics[0]!.re).toBeCloseTo(3 * Math.cos(0.4), 13)
    expect(first.harmonics[0]!.im).toBeCloseTo(-3 * Math.sin(0.4), 13)
    expect(first.harmonics[4]!.im).toBeCloseTo(-0.2, 13)
    expect(first.rms).toBeCloseTo(Math.sqrt(0.25 + 4.5 + 0.02), 13)
    expect(second.mean).toBeCloseTo(-1, 14)
    expect(second.harmonics[0]!.im).toBeCloseTo(-2, 13)
    expect(second.harmonics[1]!.re).toBeCloseTo(0.1 * Math.cos(1), 13)
    expect(totalHarmonicDistortion(second.harmonics)).toBeCloseTo(0.05, 13)
  })

  it('refuses harmonics that the samples do not resolve', () => {
    const signal = sampled(Math.sin)
    expect(() => analysePair(signal, signal, n / 2)).toThrow(RangeError)
    expect(() => analysePair(signal, signal.slice(1), 3)).toThrow(RangeError)
  })
})
