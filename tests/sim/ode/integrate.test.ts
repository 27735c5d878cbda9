import { describe, expect, it } from 'vitest'
import { integrate, WorkMeter, type Problem } from '#sim/ode/integrate.ts'

/** x″ = −x from (1, 0): x = cos t. */
function circle(changes: Partial<Problem> = {}): Problem {
  return {
    derivative: (_t, y, out) => {
      out[0] = y[1]!
      out[1] = -y[0]!
    },
    start: 0,
    end: 20,
    initial: [1, 0],
    stiff: true,
    tolerance: [1e-9, 1e-9],
    firstStep: 1e-3,
    longestStep: 1,
    work: new WorkMeter(1_000_000),
    ...changes,
  }
}

describe('integrate', () => {
  it('follows a circle, between the steps as well', () => {
    let largest = 0
    const outcome = integrate(circle(), (from, to, _y, dense) => {
      for (let n = 0; n <= 10; n++) {
        const t = from + ((to - from) * n) / 10
        largest = Math.max(largest, Math.abs(dense(0, t) - Math.cos(t)))
      }
      return true
    })
    expect(outcome).toBe('reachedEnd')
    expect(largest).toBeLessThan(1e-7)
  })

  // The error estimate of the member with k columns is of order 2k − 1 (Hairer, Nørsett & Wanner §II.9), three here: a
  // tolerance 100 times finer takes 100^(1/3) times the work.
  it('gains accuracy with the tolerance at the price of its order', () => {
    const [coarse, middle, fine] = [1e-6, 1e-8, 1e-10].map((tolerance) => {
      const work = new WorkMeter(1_000_000)
      let error = 0
      const problem = circle({
        tolerance: [tolerance, tolerance],
        work,
      })
      integrate(problem, (_from, to, y) => {
        error = Math.max(error, Math.abs(y[0]! - Math.cos(to)))
        return true
      })
      return { error, evaluations: work.evaluations }
    })
    expect(middle!.error).toBeLessThan(coarse!.error / 10)
    expect(fine!.error).toBeLessThan(middle!.error / 10)
    expect(Math.abs(fine!.evaluations / middle!.evaluations / Math.cbrt(100) - 1)).toBeLessThan(0.1)
  })

  it('starts in nanoseconds as well as in hours', () => {
    for (const unit of [1e-9, 1e4]) {
      let end = 0
      const outcome = integrate(
        circle({
          derivative: (_t, y, out) => {
            out[0] = y[1]! / unit
            out[1] = -y[0]! / unit
          },
          start: 5 * unit,
          end: 6 * unit,
          firstStep: 1e-3 * unit,
          longestStep: unit,
        }),
        (_from, to, y) => {
          end = y[0]!
          return to <= 6 * unit
        },
      )
      expect(outcome).toBe('reachedEnd')
      expect(end).toBeCloseTo(Math.cos(1), 8)
    }
  })

  it('ends when the observer says so', () => {
    let seen = 0
    expect(integrate(circle(), () => ++seen < 3)).toBe('endedByObserver')
    expect(seen).toBe(3)
  })

  it('ends at the work limit and says so', () => {
    const work = new WorkMeter(200)
    expect(integrate(circle({ work }), () => true)).toBe('workExceeded')
    expect(work.evaluations).toBe(201)
  })

  it('ends when the solution leaves the range of numbers', () => {
    const explosion = circle({
      derivative: (_t, y, out) => {
        out[0] = y[0]! * y[0]!
        out[1] = NaN
      },
    })
    expect(['notFinite', 'workExceeded', 'tooManySteps']).toContain(integrate(explosion, () => true))
  })
})
