import { describe, expect, it } from 'vitest'
import { simulate } from '#sim/index.ts'
import { makeCircuit } from '#tests/sim/support/circuits.ts'

/**
 * Describing function of symmetric clipping, N = (2/π)(asin c + c√(1 − c²)): the loop settles where K·N = 3. Its
 * fundamentals over the clip level, computed outside this project. The function reckons with a pure sine at the clipped
 * node's input, so it is an estimate that gets better as K → 3.
 */
const estimates = [
  [3.3, 1.1119],
  [3.1, 1.0641],
  [3.03, 1.0324],
  [3.01, 1.0168],
] as const

describe('level of a loop that clips at its rails', () => {
  it('approaches the describing function as the gain approaches 3', () => {
    const errors = estimates.map(([gain, estimate]) => {
      const circuit = makeCircuit({
        gain: { feedbackR: 10e3 * (gain - 1), groundR: 10e3 },
        amplifier: { gainBandwidth: 3e6, slewRate: 1e8, openLoopGain: 1e7, offset: 1e-6 },
      })
      const { figures, tone } = simulate(circuit, {
        stimulus: { kind: 'kick', voltage: 2.5 },
        duration: 0.06,
        sampleInterval: 10e-6,
      })
      const { re, im } = tone!.harmonics[0]!
      return Math.abs(Math.hypot(re, im) / figures!.level! / estimate - 1)
    })
    expect(errors).toEqual([...errors].sort((a, b) => b - a))
    expect(errors[0]).toBeLessThan(0.03)
    expect(errors.at(-1)).toBeLessThan(0.002)
  })
})
