import { describe, expect, it } from 'vitest'
import { timeTo90 } from '#sim/settled/time-to-90.ts'

describe('timeTo90', () => {
  it('joins successive maxima by straight lines', () => {
    expect(timeTo90([1, 2, 3], [2, 8, 10], 10)).toBeCloseTo(2.5, 14)
  })
  it('is the first maximum where that is high enough', () => {
    expect(timeTo90([0.2, 0.4], [9.5, 10], 10)).toBe(0.2)
  })
  it('does not exist when no maximum is', () => {
    expect(timeTo90([1, 2], [1, 2], 10)).toBeNull()
    expect(timeTo90([], [], 10)).toBeNull()
  })
})
