import { describe, expect, it } from 'vitest'
import { harmonicRows } from '#client/components/charts/harmonic-rows.ts'

/**
 * Fourier series of a square wave of height ±1 that rises at t = 0: odd harmonics 4/(πk), sines, nothing else
 * (closed form, any handbook of mathematics). A sine of height b is c_k = −j b in the convention of the engine.
 */
const square = Array.from({ length: 20 }, (_, i) => {
  const k = i + 1
  return { re: 0, im: k % 2 === 1 ? -4 / (Math.PI * k) : 0 }
})

describe('harmonicRows of a square wave', () => {
  const rows = harmonicRows(square, 1000)

  it('gives the closed form 4/(πk) for odd harmonics and nothing for even ones', () => {
    for (const { order, level, frequency } of rows) {
      expect(frequency).toBe(1000 * order)
      expect(level).toBeCloseTo(order % 2 === 1 ? 4 / (Math.PI * order) : 0, 14)
    }
  })

  it('gives 1/k of the fundamental: 33.3 %, −9.54 dB for the third', () => {
    expect(rows[0]).toMatchObject({ ratio: 1, decibels: 0 })
    expect(rows[2]!.ratio).toBeCloseTo(1 / 3, 14)
    expect(rows[2]!.decibels).toBeCloseTo(-9.5424, 4)
    expect(rows[18]!.ratio).toBeCloseTo(1 / 19, 14)
  })

  it('gives sines a phase of −90° and harmonics that are not there none', () => {
    expect(rows[0]!.phase).toBeCloseTo(-90, 12)
    expect(rows[2]!.phase).toBeCloseTo(-90, 12)
    expect(rows[1]).toMatchObject({ ratio: 0, phase: null })
  })
})

describe('harmonicRows', () => {
  it('survives a tone without a fundamental', () => {
    expect(harmonicRows([{ re: 0, im: 0 }], 1000)[0]).toMatchObject({ level: 0, ratio: 0, phase: null })
  })
})
