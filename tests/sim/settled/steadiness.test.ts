import { describe, expect, it } from 'vitest'
import type { Cycle } from '#sim/record/cycles.ts'
import { cutsPerPeriod } from '#sim/settled/steadiness.ts'

/** Cycles of 1 ms whose level is a given function of their number. */
function cycles(count: number, level: (n: number) => number, length = (_n: number) => 1e-3): Cycle[] {
  let start = 0
  return Array.from({ length: count }, (_, n) => {
    const cycle = { start, end: start + length(n), high: level(n), low: -level(n) }
    start = cycle.end
    return cycle
  })
}

describe('cutsPerPeriod', () => {
  it('takes equal cycles for settled', () => {
    expect(cutsPerPeriod(cycles(40, () => 5))).toBe(1)
  })

  it('needs some cycles', () => {
    expect(cutsPerPeriod(cycles(7, () => 5))).toBeNull()
  })

  it('does not take slow growth for settled', () => {
    expect(cutsPerPeriod(cycles(400, (n) => Math.exp(1e-5 * n)))).toBeNull()
  })

  it('does not take a slow approach for settled while much of it is to come', () => {
    expect(cutsPerPeriod(cycles(100, (n) => 5 * (1 - Math.exp(-0.001 * n))))).toBeNull()
    expect(cutsPerPeriod(cycles(20_000, (n) => 5 * (1 - Math.exp(-0.001 * n))))).toBe(1)
  })

  it('waits for an envelope that swings', () => {
    const swinging = (rate: number) => (n: number) => 5 * (1 + 0.1 * Math.exp(-rate * n) * Math.cos(0.2 * n))
    expect(cutsPerPeriod(cycles(1000, swinging(0)))).toBeNull()
    expect(cutsPerPeriod(cycles(1000, swinging(0.003)))).toBeNull()
    expect(cutsPerPeriod(cycles(2000, swinging(0.008)))).toBe(1)
  })

  it('knows a motion that repeats after two rising zeros', () => {
    expect(cutsPerPeriod(cycles(60, (n) => (n % 2 === 0 ? 5 : 3)))).toBe(2)
    expect(
      cutsPerPeriod(
        cycles(
          60,
          () => 5,
          (n) => (n % 3 === 0 ? 1e-3 : 5e-4),
        ),
      ),
    ).toBe(3)
  })
})
