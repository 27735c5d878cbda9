import { describe, expect, it } from 'vitest'
import type { Guard } from '#sim/modes/mode.ts'
import { firstFiring, Stretch, watch } from '#sim/modes/stretch.ts'

/** A guard that is a given function of time, and a stretch over [0, 1] whose state is the time itself. */
function guardOf(value: (t: number) => number, rate: (t: number) => number): Guard {
  return {
    value: (_t, y) => value(y[0]!),
    rate: (_t, y) => rate(y[0]!),
    resolution: 1e-12,
    limit: 'highRail',
  }
}

function firing(guard: Guard) {
  const stretch = new Stretch(1)
  stretch.set('linear', 0, 1, [1], (_index, t) => t)
  return firstFiring([watch(guard, 0, [0])], stretch, 0, 1)
}

describe('firstFiring', () => {
  it('locates a sign change to the last bits', () => {
    const found = firing(
      guardOf(
        (t) => 0.7 - t * t,
        (t) => -2 * t,
      ),
    )
    expect(Math.abs(found!.time - Math.sqrt(0.7))).toBeLessThan(1e-15)
  })

  it('finds the first of two crossings inside one step', () => {
    const found = firing(
      guardOf(
        (t) => (t - 0.3) * (t - 0.31),
        (t) => 2 * t - 0.61,
      ),
    )
    expect(found!.time).toBeCloseTo(0.3, 14)
  })

  it('finds a first touch much shorter than the step', () => {
    const found = firing(
      guardOf(
        (t) => (t - 0.5) ** 2 - 1e-10,
        (t) => 2 * (t - 0.5),
      ),
    )
    expect(found!.time).toBeCloseTo(0.5 - 1e-5, 12)
  })

  it('lets a dip that stays positive pass', () => {
    expect(
      firing(
        guardOf(
          (t) => (t - 0.5) ** 2 + 1e-10,
          (t) => 2 * (t - 0.5),
        ),
      ),
    ).toBeNull()
  })

  it('does not fire again at the rail just left with zero slope', () => {
    expect(
      firing(
        guardOf(
          (t) => t * t,
          (t) => 2 * t,
        ),
      ),
    ).toBeNull()
    expect(
      firing(
        guardOf(
          (t) => t * t - 1e-16,
          (t) => 2 * t,
        ),
      ),
    ).toBeNull()
  })

  it('fires at once when it starts at zero and goes the wrong way', () => {
    expect(
      firing(
        guardOf(
          (t) => -t,
          () => -1,
        ),
      )!.time,
    ).toBe(0)
  })

  it('takes the earlier of two guards', () => {
    const stretch = new Stretch(1)
    stretch.set('linear', 0, 1, [1], (_index, t) => t)
    const late = guardOf(
      (t) => 0.8 - t,
      () => -1,
    )
    const early = guardOf(
      (t) => 0.2 - t,
      () => -1,
    )
    const found = firstFiring([watch(late, 0, [0]), watch(early, 0, [0])], stretch, 0, 1)
    expect(found!.guard).toBe(early)
  })
})
