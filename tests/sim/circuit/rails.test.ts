import { describe, expect, it } from 'vitest'
import { railAt, railPieces } from '#sim/circuit/rails.ts'
import { makeCircuit } from '#tests/sim/support/circuits.ts'

const circuit = makeCircuit({
  supply: { positive: 10, negative: 5 },
  amplifier: { headroomHigh: 2, headroomLow: 1 },
})

describe('railPieces', () => {
  it('is one steady piece unless the stimulus is a ramp', () => {
    expect(railPieces(circuit, { kind: 'offset' })).toEqual([
      { start: 0, end: Infinity, high: { level: 8, slope: 0 }, low: { level: 4, slope: 0 } },
    ])
  })

  it('follows max(0, supply·share − headroom) at every instant of a ramp', () => {
    const positive = { delay: 1e-3, riseTime: 4e-3 }
    const negative = { delay: 2e-3, riseTime: 10e-3 }
    const pieces = railPieces(circuit, { kind: 'ramp', positive, negative })
    const share = (t: number, ramp: typeof positive) =>
      Math.min(1, Math.max(0, (t - ramp.delay) / ramp.riseTime))
    for (let n = 0; n <= 300; n++) {
      const t = n * 5e-5 + 1e-9
      const piece = pieces.findLast(({ start }) => start <= t)!
      expect(railAt(piece, piece.high, t)).toBeCloseTo(Math.max(0, 10 * share(t, positive) - 2), 12)
      expect(railAt(piece, piece.low, t)).toBeCloseTo(Math.max(0, 5 * share(t, negative) - 1), 12)
    }
  })

  it('takes a rise time of zero as a step', () => {
    const step = { delay: 1e-3, riseTime: 0 }
    const pieces = railPieces(circuit, { kind: 'ramp', positive: step, negative: { delay: 0, riseTime: 0 } })
    expect(pieces.map(({ start, high, low }) => [start, high.level, low.level])).toEqual([
      [0, 0, 4],
      [1e-3, 8, 4],
    ])
  })
})
