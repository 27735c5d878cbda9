import { describe, expect, it } from 'vitest'
import { bracketedRoot } from '#sim/linalg/root.ts'
import { integrate, WorkMeter } from '#sim/ode/integrate.ts'

/** Period and amplitude of x″ − μ(1 − x²)x′ + x = 0 once settled, through the engine's integrator. */
function cycle(mu: number, settleTime: number) {
  const rising: number[] = []
  let amplitude = 0
  let before = [2, 0]
  const outcome = integrate(
    {
      derivative: (_t, y, out) => {
        out[0] = y[1]!
        out[1] = mu * (1 - y[0]! * y[0]!) * y[1]! - y[0]!
      },
      start: 0,
      end: 1e6,
      initial: before,
      stiff: false,
      tolerance: [1e-11, 1e-11],
      firstStep: 1e-4,
      longestStep: 0.1,
      work: new WorkMeter(20_000_000),
    },
    (from, to, y, dense) => {
      if (from > settleTime && before[0]! < 0 && y[0]! >= 0)
        rising.push(bracketedRoot((t) => dense(0, t), from, to))
      if (rising.length === 1 && before[1]! > 0 && y[1]! <= 0)
        amplitude = dense(
          0,
          bracketedRoot((t) => dense(1, t), from, to),
        )
      before = [...y]
      return rising.length < 2
    },
  )
  expect(outcome).toBe('endedByObserver')
  return { period: rising[1]! - rising[0]!, amplitude }
}

/**
 * μ = 1: digits that several public repositories give, citing E. Hairer. The others: computed outside this project to
 * the digits shown.
 */
describe('van der Pol oscillator', () => {
  it.each([
    [0.1, 6.2871113, 2.000104, 7],
    [0.5, 6.3806758, 2.0024879, 7],
    [1, 6.66328685932313, 2.008619860874843, 9],
    [2, 7.6298745, 2.0198914, 7],
    [5, 11.6122307, 2.0215081, 7],
    [10, 19.0783696, 2.0142854, 7],
  ])('μ = %d has period %d and amplitude %d', (mu, period, amplitude, digits) => {
    const found = cycle(mu, 20 / Math.min(mu, 1) + 30)
    expect(found.period).toBeCloseTo(period, digits)
    expect(found.amplitude).toBeCloseTo(amplitude, digits)
  })
})
