import { beforeAll, describe, expect, it } from 'vitest'
import type { FigureKey } from '#shared/figures.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'
import { simulate, type ModeSpan, type Simulation } from '#sim/index.ts'
import { makeCircuit } from '#tests/sim/support/circuits.ts'

/**
 * Independent computation with general-purpose scientific Python: each mode propagated exactly by matrix exponentials,
 * mode changes located by Brent's method, harmonics by Gauss quadrature between them. Two step sizes agree to 1e-11.
 * Bounds are relative, shares absolute, the mean relative to the level; THD, mean and r.m.s. carry the fold-back of the
 * 4096-point grid. A single supply of 5 V is met here, and modes and figures that no case of `reference-values.json` has.
 */
const bound: Partial<Record<FigureKey, number>> = {
  frequency: 5e-10,
  high: 1e-9,
  low: 1e-9,
  thd: 3e-6,
  thdAtInput: 1e-8,
  mean: 3e-7,
  rms: 2e-6,
  heldHigh: 5e-10,
  heldLow: 5e-10,
  slewUp: 1e-9,
  slewDown: 1e-9,
  peakOutputCurrent: 1e-6,
  timeTo90: 1e-9,
}

interface Case {
  name: string
  circuit: Circuit
  stimulus: Stimulus
  duration: number
  figures: Partial<Record<FigureKey, number>>
  /** Its first mode changes. */
  changes: [mode: ModeSpan['mode'], start: number][]
}

const cases: Case[] = [
  {
    name: 'a 10 kHz loop that 20 V/ms of slew rate limit',
    circuit: makeCircuit({
      network: { seriesC: 1.6e-9, shuntC: 1.6e-9 },
      gain: { feedbackR: 22e3 },
      amplifier: { slewRate: 2e4 },
      supply: { positive: 15, negative: 15 },
    }),
    stimulus: { kind: 'offset' },
    duration: 0.01,
    figures: {
      frequency: 7299.34351066,
      high: 0.600159893918,
      low: -0.593759996317,
      thd: 0.0908682506676,
      thdAtInput: 0.0794379428894,
      mean: 0.00319994880082,
      rms: 0.383929610655,
      heldHigh: 0,
      heldLow: 0,
      slewUp: 0.384653937986,
      slewDown: 0.384653937986,
      peakOutputCurrent: 4.06546887682e-5,
      timeTo90: 0.000781625359513,
    },
    changes: [
      ['slewUp', 0.0006355760223175561],
      ['linear', 0.0006463018444304133],
      ['slewDown', 0.0006798304236637251],
      ['linear', 0.0007118679540478914],
    ],
  },
  {
    name: 'rails that come up one after the other',
    circuit: makeCircuit({ gain: { feedbackR: 22e3 } }),
    stimulus: {
      kind: 'ramp',
      positive: { delay: 2e-3, riseTime: 10e-3 },
      negative: { delay: 11e-3, riseTime: 3e-3 },
    },
    duration: 0.06,
    figures: {
      frequency: 972.041940916,
      high: 7.5,
      low: -7.5,
      thd: 0.0860650021027,
      thdAtInput: 0.0619926989831,
      mean: 0.00243350911338,
      rms: 5.90050663134,
      heldHigh: 0.181099345069,
      heldLow: 0.180715626612,
      slewUp: 0,
      slewDown: 0,
      peakOutputCurrent: 0.000694756133325,
      timeTo90: 0.0232599253485,
    },
    changes: [
      ['linear', 0.003669809750368985],
      ['heldLow', 0.004213120292201163],
      ['linear', 0.0046953549326591544],
      ['heldLow', 0.005480198525685554],
      ['linear', 0.0057402376468956105],
    ],
  },
  {
    name: 'a single supply about a reference, with a load',
    circuit: makeCircuit({
      gain: { feedbackR: 22e3 },
      amplifier: { headroomHigh: 0.1, headroomLow: 0.05, offset: 2e-3 },
      supply: { positive: 2.5, negative: 2.5, reference: 2.5 },
      load: { resistance: 2e3 },
    }),
    stimulus: { kind: 'offset' },
    duration: 0.06,
    figures: {
      frequency: 971.948119847,
      high: 2.4,
      low: -2.45,
      thd: 0.086630173087,
      thdAtInput: 0.0626625770814,
      mean: -0.00111935398061,
      rms: 1.90756915916,
      heldHigh: 0.18664089438,
      heldLow: 0.174989194253,
      slewUp: 0,
      slewDown: 0,
      peakOutputCurrent: 0.00144886517233,
      timeTo90: 0.00759999184533,
    },
    changes: [
      ['heldLow', 0.007820623564261844],
      ['linear', 0.00792038923435059],
      ['heldHigh', 0.008260985736218628],
      ['linear', 0.008448073046586048],
    ],
  },
  {
    name: 'a gain of 101: slewing, held, nothing like a sine',
    circuit: makeCircuit({ gain: { feedbackR: 1e6 } }),
    stimulus: { kind: 'offset' },
    duration: 0.08,
    figures: {
      frequency: 260.087629866,
      high: 7.5,
      low: -7.5,
      thd: 0.454453902031,
      thdAtInput: 0.664187206354,
      mean: 0.0220943502281,
      rms: 7.45655998751,
      heldHigh: 0.486926756178,
      heldLow: 0.484023665395,
      slewUp: 0.00618649873718,
      slewDown: 0.00618594360232,
      peakOutputCurrent: 0.00125458285872,
      timeTo90: 4.13658813339e-5,
    },
    changes: [
      ['slewUp', 3.265951010371731e-5],
      ['heldHigh', 4.136588133392826e-5],
      ['linear', 0.001634218054844371],
      ['slewDown', 0.0016663633882602138],
      ['heldLow', 0.0016901474629026564],
    ],
  },
]

describe.each(cases)('$name', ({ circuit, stimulus, duration, figures, changes }) => {
  let simulation: Simulation
  beforeAll(() => {
    simulation = simulate(circuit, { stimulus, duration, sampleInterval: 10e-6 })
  })

  it('settles to the figures', () => {
    expect(simulation.unsettled).toBeNull()
    const level = Math.max(figures.high!, -figures.low!)
    const scaleOf = (key: FigureKey) => {
      if (key === 'mean') return level
      return ['heldHigh', 'heldLow', 'slewUp', 'slewDown'].includes(key) ? 1 : Math.abs(figures[key]!)
    }
    for (const key of Object.keys(figures) as FigureKey[])
      expect(Math.abs(simulation.figures![key]! - figures[key]!) / scaleOf(key), key).toBeLessThan(
        bound[key]!,
      )
  })

  it('changes modes at the instants', () => {
    const found = simulation.modes.slice(1, 1 + changes.length)
    expect(found.map(({ mode }) => mode)).toEqual(changes.map(([mode]) => mode))
    for (const [n, [, start]] of changes.entries())
      expect(Math.abs(found[n]!.start / start - 1)).toBeLessThan(1e-8)
  })
})
