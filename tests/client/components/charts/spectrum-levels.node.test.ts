import { describe, expect, it } from 'vitest'
import { axisFloor, decibels, levelTicks, stemHeight } from '#client/components/charts/spectrum-levels.ts'

describe('spectrum levels', () => {
  it('takes decibels of a voltage ratio: a tenth is −20 dB, a half −6.02 dB (definition of the decibel)', () => {
    expect(decibels(0.1)).toBeCloseTo(-20, 12)
    expect(decibels(0.5)).toBeCloseTo(-6.0206, 4)
  })

  it('ends the axis at a whole decade below the weakest harmonic, within limits', () => {
    expect(axisFloor([1, 0.02])).toBe(-60)
    expect(axisFloor([1, 3e-4, 0])).toBe(-80)
    expect(axisFloor([1, 1e-15])).toBe(-160)
    expect(axisFloor([])).toBe(-60)
  })

  it('draws the fundamental full height, nothing below the axis, and −20 dB a third of 60 dB down', () => {
    expect(stemHeight(1, -60)).toBe(1)
    expect(stemHeight(0.1, -60)).toBeCloseTo(2 / 3, 12)
    expect(stemHeight(1e-4, -60)).toBe(0)
    expect(stemHeight(0, -60)).toBe(0)
  })

  it('marks decades from the fundamental down to the floor', () => {
    expect(levelTicks(-60).map(Math.abs)).toEqual([0, 20, 40, 60])
    expect(levelTicks(-160)).toHaveLength(5)
  })
})
