import type { Clock } from '#server/clock.ts'

/** A clock that stands still until a test moves it. */
export interface TestClock extends Clock {
  /** @param duration milliseconds */
  advance(duration: number): void
}

export function createTestClock(start = new Date('2026-03-02T08:00:00.000Z')): TestClock {
  let now = start.getTime()
  return Object.assign(() => new Date(now), {
    advance(duration: number) {
      now += duration
    },
  })
}
