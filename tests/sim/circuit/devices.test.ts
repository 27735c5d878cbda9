import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { DiodePath } from '#sim/circuit/diodes.ts'
import { gainPathOf } from '#sim/circuit/gain-path-of.ts'
import { diodes, makeCircuit, quickLamp } from '#tests/sim/support/circuits.ts'

const pair = diodes as Extract<typeof diodes, { kind: 'diodes' }>

describe('DiodePath', () => {
  it('obeys its node equation from microvolts to kilovolts without overflow', () => {
    const path = new DiodePath({ feedbackR: 25e3, groundR: 10e3 }, pair)
    const scale = pair.emissionCoefficient * pair.thermalVoltage
    fc.assert(
      fc.property(fc.double({ min: -6, max: 3.3, noNaN: true }), fc.boolean(), (decade, negative) => {
        const vo = (negative ? -1 : 1) * 10 ** decade
        const vx = path.pairVoltage(vo)
        const left = (vo - vx) / (pair.seriesR + 10e3)
        const right = vx / pair.shuntedR + 2 * pair.saturationCurrent * Math.sinh(vx / scale)
        expect(Math.abs(left / right - 1)).toBeLessThan(1e-11)
      }),
      { seed: 3 },
    )
  })

  it('is odd', () => {
    const path = new DiodePath({ feedbackR: 25e3, groundR: 10e3 }, pair)
    expect(path.pairVoltage(-4)).toBe(-path.pairVoltage(4))
    expect(path.pairVoltage(0)).toBe(0)
  })
})

describe.each([
  ['two resistors', makeCircuit(), 0],
  ['diodes', makeCircuit({ amplitudeControl: diodes }), 0],
  ['a lamp', makeCircuit({ gain: { feedbackR: 430, groundR: 150 }, amplitudeControl: quickLamp }), 380],
])('the gain path of %s', (_name, circuit, device) => {
  const path = gainPathOf(circuit)

  it('states the rate of the inverting input as its difference quotient has it', () => {
    for (const vo of [-6, -0.4, 0.02, 1, 7]) {
      const step = 1e-5
      const [voRate, deviceRate] = [3, device ? 40 : 0]
      const ahead = path.invertingInput(vo + step * voRate, device + step * deviceRate)
      const behind = path.invertingInput(vo - step * voRate, device - step * deviceRate)
      const rate = path.invertingInputRate(vo, device, voRate, deviceRate)
      expect(rate).toBeCloseTo((ahead - behind) / (2 * step), 6)
    }
  })

  it('carries the current that ground R makes of the inverting input', () => {
    const groundR =
      circuit.amplitudeControl.kind === 'lamp' ? 150 * (device / 300) ** 1.2 : circuit.gain.groundR
    expect(path.current(5, device) * groundR).toBeCloseTo(path.invertingInput(5, device), 12)
  })
})

describe('the lamp', () => {
  it('rests where the power equals what it loses', () => {
    const circuit = makeCircuit({
      gain: { feedbackR: 430, groundR: 150 },
      amplitudeControl: { ...quickLamp, kind: 'lamp', radiation: 1e-15 } as typeof quickLamp,
    })
    const path = gainPathOf(circuit)
    const temperature = 420
    const lost = 8e-5 * (temperature - 300) + 1e-15 * (temperature ** 4 - 300 ** 4)
    const resistance = 150 * (temperature / 300) ** 1.2
    const vo = Math.sqrt(lost / resistance) * (resistance + 430)
    expect(path.deviceRate(vo, temperature) * 8e-7).toBeCloseTo(0, 12)
    expect(path.deviceRate(0, 300)).toBe(0)
  })
})
