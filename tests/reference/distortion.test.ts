import { describe, expect, it } from 'vitest'
import { analysePair, totalHarmonicDistortion } from '#sim/spectrum/harmonics.ts'

const samples = 4096
/** All that the grid holds: what lies beyond folds back, so that the sum of squares is that of the whole series. */
const all = samples / 2 - 1

/** Samples of a period of `wave`, a function of the share of the period, at the middles of equal intervals. */
function sampled(wave: (x: number) => number): Float64Array {
  return Float64Array.from({ length: samples }, (_, n) => wave((n + 0.5) / samples))
}

function thdOf(wave: (x: number) => number, count = all): number {
  const signal = sampled(wave)
  return totalHarmonicDistortion(analysePair(signal, signal, count)[0].harmonics)
}

const square = (x: number) => (x < 0.5 ? 1 : -1)
const triangle = (x: number) => 1 - 4 * Math.abs(x - 0.5)
const sawtooth = (x: number) => 2 * x - 1

/** Closed forms from the Fourier series of the waves. */
describe('THD of waves with a known series', () => {
  it.each([
    ['square', square, Math.sqrt(Math.PI ** 2 / 8 - 1), 0.483426],
    ['triangle', triangle, Math.sqrt(Math.PI ** 4 / 96 - 1), 0.121153],
    ['sawtooth', sawtooth, Math.sqrt(Math.PI ** 2 / 6 - 1), 0.80308],
  ])('of a %s', (_name, wave, closedForm, printed) => {
    expect(closedForm).toBeCloseTo(printed, 5)
    expect(thdOf(wave)).toBeCloseTo(closedForm, 5)
  })

  it('over harmonics 2 to 20 of a triangle is its partial sum', () => {
    const partial = [3, 5, 7, 9, 11, 13, 15, 17, 19].reduce((sum, k) => sum + k ** -4, 0)
    expect(thdOf(triangle, 20)).toBeCloseTo(Math.sqrt(partial), 6)
  })
})

/**
 * A sine clipped symmetrically at the share c of its peak, closed form with θ = asin c: b1 = (2/π)(θ + c√(1 − c²)), mean
 * square (2/π)[θ/2 − sin 2θ/4 + c²(π/2 − θ)].
 */
describe('THD of a clipped sine', () => {
  it.each([
    [0.99, 0.00286],
    [0.95, 0.01924],
    [0.9, 0.0422],
    [0.8, 0.08979],
    [0.5, 0.23294],
  ])('clipped at %d of its peak', (c, printed) => {
    const theta = Math.asin(c)
    const fundamental = (2 / Math.PI) * (theta + c * Math.sqrt(1 - c * c))
    const meanSquare = (2 / Math.PI) * (theta / 2 - Math.sin(2 * theta) / 4 + c * c * (Math.PI / 2 - theta))
    const closedForm = Math.sqrt(meanSquare / (fundamental ** 2 / 2) - 1)
    expect(closedForm).toBeCloseTo(printed, 5)
    const clipped = (x: number) => Math.max(-c, Math.min(c, Math.sin(2 * Math.PI * x)))
    expect(thdOf(clipped)).toBeCloseTo(closedForm, 6)
  })
})
