import { describe, expect, it } from 'vitest'
import { smallSignal } from '#sim/index.ts'
import { makeCircuit } from '#tests/sim/support/circuits.ts'

/** So fast and so high in gain that the amplifier is ideal to eight digits and more. */
const nearlyIdeal = { gainBandwidth: 1e11, openLoopGain: 1e9 }

/** Any textbook on RC oscillators: equal arms need a gain of 3 and oscillate at 1/(2πRC). */
describe('the loop with a nearly ideal amplifier', () => {
  it.each([
    [10e3, 16e-9],
    [1e3, 100e-9],
    [47, 1e-6],
  ])('oscillates at 1/(2πRC) with a critical gain of 3 for equal arms of %d Ω, %d F', (r, c) => {
    const result = smallSignal(
      makeCircuit({
        network: { seriesR: r, shuntR: r, seriesC: c, shuntC: c },
        gain: { feedbackR: 2 * r, groundR: r },
        amplifier: nearlyIdeal,
      }),
    )
    expect(result.frequency * 2 * Math.PI * r * c).toBeCloseTo(1, 6)
    expect(result.criticalGain).toBeCloseTo(3, 7)
    expect(result.idealCriticalGain).toBe(3)
  })

  // Textbook, derived in one line from s²RsRpCsCp + s[RsCs + RpCp + RpCs(1−K)] + 1 = 0.
  it.each([
    [10e3, 15e-9, 10.5e3, 16.5e-9],
    [1e3, 100e-9, 2.2e3, 100e-9],
    [22e3, 1e-9, 4.7e3, 33e-9],
  ])(
    'needs 1 + Rs/Rp + Cp/Cs and oscillates at 1/(2π√(RsRpCsCp)) for unequal arms',
    (seriesR, seriesC, shuntR, shuntC) => {
      const critical = 1 + seriesR / shuntR + shuntC / seriesC
      const result = smallSignal(
        makeCircuit({
          network: { seriesR, seriesC, shuntR, shuntC },
          gain: { groundR: 1e3, feedbackR: 1e3 * (critical - 1) },
          amplifier: nearlyIdeal,
        }),
      )
      expect(result.criticalGain / critical).toBeCloseTo(1, 6)
      expect(result.frequency * 2 * Math.PI * Math.sqrt(seriesR * shuntR * seriesC * shuntC)).toBeCloseTo(
        1,
        5,
      )
    },
  )

  // s² + (3 − A)ω0 s + ω0² = 0, textbook: σ = (A − 3)ω0/2.
  it.each([2.5, 2.9, 3.02, 3.5, 4.5])('grows at (A − 3)ω0/2 with gain %d', (gain) => {
    const naturalRate = 1 / (10e3 * 16e-9)
    const result = smallSignal(
      makeCircuit({ gain: { groundR: 10e3, feedbackR: 10e3 * (gain - 1) }, amplifier: nearlyIdeal }),
    )
    expect(result.growthRate / (((gain - 3) * naturalRate) / 2)).toBeCloseTo(1, 5)
    expect(result.starts).toBe(gain > 3)
  })

  // Sedra & Smith, Microelectronic Circuits, oscillator chapter (from memory, recomputed): K = 3.03 with 10 kΩ and
  // 16 nF puts the poles at (10⁵/16)(0.015 ± j), 994.7 Hz.
  it('has the poles of the textbook example', () => {
    const { poles, frequency, growthRate } = smallSignal(
      makeCircuit({ gain: { feedbackR: 20.3e3 }, amplifier: nearlyIdeal }),
    )
    const unit = 1e5 / 16
    expect(growthRate).toBeCloseTo(93.75, 2)
    expect(frequency).toBeCloseTo(994.7, 0)
    expect(
      poles.some(({ re, im }) => Math.abs(re / unit - 0.015) < 1e-6 && Math.abs(im / unit - 0.9999) < 1e-3),
    ).toBe(true)
  })
})
