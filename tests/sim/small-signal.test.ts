import { describe, expect, it } from 'vitest'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { Plant } from '#sim/circuit/plant.ts'
import { smallSignal } from '#sim/index.ts'
import type { Complex } from '#sim/types.ts'
import { diodes, makeCircuit, quickLamp } from '#tests/sim/support/circuits.ts'

const times = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
})
const minus = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im })

/** |det(s − M)| of the state equations themselves over the sum of its terms' sizes, M found by differences. */
function determinantResidue(circuit: Circuit, pole: Complex): number {
  const plant = new Plant(circuit)
  const state = plant.initialState(0)
  const rest = new Array<number>(plant.dimension)
  plant.linear(0, state, rest)
  const small = 1e-6
  const columns = [0, 1, 2].map((column) => {
    const moved = [...state]
    moved[column] = small
    const rate = new Array<number>(plant.dimension)
    plant.linear(0, moved, rate)
    return [0, 1, 2].map((row) => (rate[row]! - rest[row]!) / small)
  })
  const entry = (row: number, column: number): Complex => {
    const m = { re: columns[column]![row]!, im: 0 }
    return row === column ? minus(pole, m) : { re: -m.re, im: 0 }
  }
  let determinant: Complex = { re: 0, im: 0 }
  let size = 0
  const orders: [number[], number][] = [
    [[0, 1, 2], 1],
    [[1, 2, 0], 1],
    [[2, 0, 1], 1],
    [[0, 2, 1], -1],
    [[1, 0, 2], -1],
    [[2, 1, 0], -1],
  ]
  for (const [order, sign] of orders) {
    const product = order.map((column, row) => entry(row, column)).reduce(times)
    determinant = { re: determinant.re + sign * product.re, im: determinant.im + sign * product.im }
    size += Math.hypot(product.re, product.im)
  }
  return Math.hypot(determinant.re, determinant.im) / size
}

const variety: [string, Circuit][] = [
  ['equal arms', makeCircuit()],
  ['unequal arms', makeCircuit({ network: { shuntR: 4.7e3, shuntC: 33e-9 } })],
  ['a slow amplifier', makeCircuit({ amplifier: { gainBandwidth: 2e3 } })],
  ['a very slow amplifier', makeCircuit({ amplifier: { gainBandwidth: 100 } })],
  ['a fast amplifier', makeCircuit({ amplifier: { gainBandwidth: 1e7 } })],
  ['gain 11', makeCircuit({ gain: { feedbackR: 100e3 } })],
  ['diodes', makeCircuit({ amplitudeControl: diodes })],
  ['a lamp', makeCircuit({ gain: { feedbackR: 430, groundR: 150 }, amplitudeControl: quickLamp })],
]

describe('smallSignal', () => {
  it.each(variety)('gives eigenvalues of the state equations for %s', (_name, circuit) => {
    const { poles } = smallSignal(circuit)
    expect(poles).toHaveLength(3)
    for (const pole of poles) expect(determinantResidue(circuit, pole)).toBeLessThan(1e-8)
  })

  it.each(variety)('has no growth at the critical gain for %s', (_name, circuit) => {
    const { criticalGain, frequency, gain, gainMargin } = smallSignal(circuit)
    if (!Number.isFinite(criticalGain)) {
      expect(gainMargin).toBe(-1)
      return
    }
    expect(gainMargin).toBeCloseTo(gain / criticalGain - 1, 14)
    const critical = smallSignal({
      ...circuit,
      amplitudeControl: { kind: 'none' },
      gain: { groundR: 1e3, feedbackR: 1e3 * (criticalGain - 1) },
    })
    expect(Math.abs(critical.growthRate)).toBeLessThan(
      1e-11 * 2 * Math.PI * Math.max(frequency, critical.frequency),
    )
  })

  // Computed outside this project with 60 decimal digits (Newton's method on the characteristic polynomial).
  it.each([
    [{}, 20.2e3, { gainBandwidth: 1e7, openLoopGain: 1e9 }, 0.6249940440467205, 9.94664145757659, 1e-13],
    [
      {},
      20.0001e3,
      { gainBandwidth: 1e7, openLoopGain: 2e5 },
      -0.0010937293248541387,
      9.947139417147429,
      1e-10,
    ],
    [
      { seriesC: 15e-9, shuntR: 1.05e6, shuntC: 16.5e-9 },
      22e3,
      { gainBandwidth: 1e9, openLoopGain: 1e6 },
      4.472993729460997,
      9.847043527499423,
      1e-13,
    ],
  ])(
    'keeps the slow pair of a 10 Hz loop beside a very fast amplifier',
    (network, feedbackR, amplifier, rate, hertz, bound) => {
      const { growthRate, frequency } = smallSignal(
        makeCircuit({ network: { seriesR: 1e6, shuntR: 1e6, ...network }, gain: { feedbackR }, amplifier }),
      )
      expect(Math.abs(growthRate / rate - 1)).toBeLessThan(bound)
      expect(Math.abs(frequency / hertz - 1)).toBeLessThan(1e-14)
    },
  )

  it('knows no critical gain for an amplifier slower than the network', () => {
    const { criticalGain, starts } = smallSignal(makeCircuit({ amplifier: { gainBandwidth: 100 } }))
    expect(criticalGain).toBe(Infinity)
    expect(starts).toBe(false)
  })

  it('takes the diodes at their small-signal resistance and the lamp cold', () => {
    const atZero = 15e3 + 1 / (1 / 10e3 + (2 * 4e-9) / (1.9 * 0.025852))
    expect(smallSignal(makeCircuit({ amplitudeControl: diodes })).gain).toBeCloseTo(1 + atZero / 10e3, 12)
    const lamp = makeCircuit({ gain: { feedbackR: 430, groundR: 150 }, amplitudeControl: quickLamp })
    expect(smallSignal(lamp).gain).toBeCloseTo(1 + 430 / 150, 12)
  })
})
