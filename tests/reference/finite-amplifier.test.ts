import { describe, expect, it } from 'vitest'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { smallSignal } from '#sim/index.ts'
import { makeCircuit } from '#tests/sim/support/circuits.ts'

const r = 10e3
const c = 16e-9
const idealFrequency = 1 / (2 * Math.PI * r * c)

function withGain(circuit: Circuit, gain: number): Circuit {
  return { ...circuit, gain: { groundR: 10e3, feedbackR: 10e3 * (gain - 1) } }
}

/** An integrator amplifier, A(s) = ωt/s, as nearly as the model's greatest open-loop gain allows. */
function integrator(gainBandwidth: number, network: Partial<Circuit['network']> = {}): Circuit {
  return makeCircuit({ network, amplifier: { gainBandwidth, openLoopGain: 1e9 } })
}

/**
 * Equal arms with an integrator amplifier at the threshold, derived from the characteristic polynomial:
 * τ = K·f0/ft, f = f0/√(1 + 3τ), K = 3 + 3τ²/(1 + 3τ). Numbers computed outside this project.
 */
describe('equal arms with an integrator amplifier', () => {
  it.each([
    [0.001, -0.00447, 5e-6, 3.00003, 5e-6],
    [0.01, -0.0422, 5e-5, 3.00248, 5e-6],
    [0.05, -0.172, 5e-4, 3.0478, 5e-5],
  ])(
    'at f0/ft = %d shifts the frequency by %d ± %d and needs a gain of %d ± %d',
    (ratio, shift, shiftDigit, gain, gainDigit) => {
      const circuit = integrator(idealFrequency / ratio)
      const { criticalGain } = smallSignal(circuit)
      expect(Math.abs(criticalGain - gain)).toBeLessThan(gainDigit)
      const { frequency, growthRate } = smallSignal(withGain(circuit, criticalGain))
      expect(Math.abs(frequency / idealFrequency - 1 - shift)).toBeLessThan(shiftDigit)
      expect(Math.abs(growthRate)).toBeLessThan(1e-6 * idealFrequency)
      const lag = criticalGain * ratio
      expect(frequency / (idealFrequency / Math.sqrt(1 + 3 * lag))).toBeCloseTo(1, 8)
      expect(criticalGain).toBeCloseTo(3 + (3 * lag * lag) / (1 + 3 * lag), 7)
    },
  )

  it('gives the margin of a gain over that threshold', () => {
    // K = 3.0478 at f0/ft = 0.05: a gain of 3.2 has 3.2/3.0478 − 1 = 4.994 %, not the 6.667 % over an ideal 3.
    const { gainMargin } = smallSignal(withGain(integrator(idealFrequency / 0.05), 3.2))
    expect(Math.abs(gainMargin - 0.04994)).toBeLessThan(2e-5)
  })

  // First order in f0/ft (textbook phase argument: lag A·f/GBW against a network slope of −2/3): −4.5·f0/GBW.
  it('shifts by −4.5·f0/ft while that is small', () => {
    const ratio = 1e-5
    const circuit = integrator(idealFrequency / ratio)
    const { frequency } = smallSignal(withGain(circuit, smallSignal(circuit).criticalGain))
    expect((frequency / idealFrequency - 1) / ratio).toBeCloseTo(-4.5, 2)
  })
})

/**
 * Unequal arms with an integrator amplifier, derived: S = RsCs + RpCp + RpCs, T = K/ωt, ω² = 1/(RsRpCsCp + T·S),
 * K = (S + T − ω²T·RsRpCsCp)/(RpCs), solved together here by iteration.
 */
describe('unequal arms with an integrator amplifier', () => {
  it.each([
    [10e3, 15e-9, 10.5e3, 16.5e-9, 1e6],
    [1e3, 100e-9, 2.2e3, 100e-9, 1e5],
    [22e3, 1e-9, 4.7e3, 3.3e-9, 3e5],
  ])(
    'agrees with the closed form for %d Ω, %d F, %d Ω, %d F at %d Hz',
    (seriesR, seriesC, shuntR, shuntC, gainBandwidth) => {
      const product = seriesR * shuntR * seriesC * shuntC
      const sum = seriesR * seriesC + shuntR * shuntC + shuntR * seriesC
      let gain = 3
      let omega = 0
      for (let n = 0; n < 400; n++) {
        const lag = gain / (2 * Math.PI * gainBandwidth)
        omega = Math.sqrt(1 / (product + lag * sum))
        gain = (sum + lag - omega * omega * lag * product) / (shuntR * seriesC)
      }
      const circuit = integrator(gainBandwidth, { seriesR, seriesC, shuntR, shuntC })
      const { criticalGain } = smallSignal(circuit)
      expect(criticalGain / gain).toBeCloseTo(1, 7)
      expect((2 * Math.PI * smallSignal(withGain(circuit, gain)).frequency) / omega).toBeCloseTo(1, 7)
    },
  )
})

/**
 * Constant open-loop gain A0: Rf/Rg = (2·A0 + 3)/(A0 − 3) (D. L. Schilling & C. Belove, Electronic Circuits, as cited in
 * the trade's notes). The model's amplifier has a pole as well; a gain-bandwidth of 100 GHz makes it negligible.
 */
describe('an amplifier of low open-loop gain', () => {
  it.each([20, 100, 1000, 1e5])('of %d needs (2A0 + 3)/(A0 − 3)', (openLoopGain) => {
    const { criticalGain } = smallSignal(makeCircuit({ amplifier: { openLoopGain, gainBandwidth: 1e11 } }))
    expect((criticalGain - 1) / ((2 * openLoopGain + 3) / (openLoopGain - 3))).toBeCloseTo(1, 6)
  })
})
