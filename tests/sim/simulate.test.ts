import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { figureKeys, type FigureKey } from '#shared/figures.ts'
import { simulate, type Mode, type Simulation, type Stimulus } from '#sim/index.ts'
import { diodes, makeCircuit, quickLamp } from '#tests/sim/support/circuits.ts'

const fromOffset: Stimulus = { kind: 'offset' }

function run(circuit: Circuit, duration = 0.02, stimulus = fromOffset, sampleInterval = 10e-6): Simulation {
  return simulate(circuit, { stimulus, duration, sampleInterval })
}

/** Largest relative difference of two figures, or absolute for shares and the like that may be zero. */
function difference(a: Simulation, b: Simulation, key: FigureKey, factor = 1): number {
  const [x, y] = [a.figures![key]!, b.figures![key]! * factor]
  return Math.abs(x - y) / Math.max(Math.abs(y), 1e-3)
}

const settledKeys: FigureKey[] = [
  'level',
  'high',
  'low',
  'rms',
  'thd',
  'thdAtInput',
  'heldHigh',
  'heldLow',
  'slewUp',
]

describe('simulate', () => {
  it('fills columns of round(duration/sampleInterval) + 1 samples and every figure', () => {
    const simulation = run(makeCircuit(), 0.02, fromOffset, 7e-6)
    const samples = Math.round(0.02 / 7e-6) + 1
    expect([simulation.vo, simulation.v1, simulation.v2].map((column) => column.length)).toEqual(
      Array(3).fill(samples),
    )
    expect(simulation.status).toBe('complete')
    expect(simulation.unsettled).toBeNull()
    for (const key of figureKeys) expect(simulation.figures![key], key).toBeTypeOf('number')
    expect(simulation.tone!.waveform.vo).toHaveLength(1024)
    expect(simulation.tone!.harmonics).toHaveLength(20)
  })

  it('covers the record with spans of modes that touch', () => {
    const { modes, vo, sampleInterval } = run(makeCircuit())
    expect(modes[0]!.start).toBe(0)
    expect(modes.at(-1)!.end).toBeCloseTo((vo.length - 1) * sampleInterval, 12)
    for (let n = 1; n < modes.length; n++) expect(modes[n]!.start).toBe(modes[n - 1]!.end)
  })

  it('follows a filament far faster than the loop, whose first trial step is much too long', () => {
    const lamp = { ...quickLamp, thermalCapacity: 8e-11 } as Circuit['amplitudeControl']
    const circuit = makeCircuit({
      network: { seriesR: 1e6, shuntR: 1e6 },
      gain: { feedbackR: 430, groundR: 150 },
      amplifier: { gainBandwidth: 5e3, slewRate: 1e4 },
      amplitudeControl: lamp,
    })
    const { status, control } = run(circuit, 5e-3, { kind: 'kick', voltage: 2 }, 0.1e-3)
    expect(status).toBe('complete')
    expect(Math.min(...control!.values)).toBeGreaterThan(299.999)
  })

  it('never leaves the rails and lies on them while held', () => {
    const { vo, modes, sampleInterval } = run(makeCircuit({ supply: { positive: 8, negative: 10 } }))
    expect(Math.max(...vo)).toBeLessThanOrEqual(6.5 + 1e-12)
    expect(Math.min(...vo)).toBeGreaterThanOrEqual(-8.5 - 1e-12)
    for (const { mode, start, end } of modes.filter((span) => span.mode === 'heldHigh')) {
      expect(mode).toBe('heldHigh')
      for (let n = Math.ceil(start / sampleInterval); n * sampleInterval < end; n++)
        expect(vo[n]).toBeCloseTo(6.5, 12)
    }
  })

  it('gives the same numbers for the same inputs, whatever the grid', () => {
    const circuit = makeCircuit()
    expect(run(circuit)).toEqual(run(circuit))
    const fine = run(circuit, 0.02, fromOffset, 1e-6)
    for (const key of settledKeys) expect(difference(run(circuit), fine, key)).toBeLessThan(1e-9)
    expect(run(circuit).vo[1500]).toBeCloseTo(fine.vo[15000]!, 12)
  })

  it('phases the harmonics from the rising zero of v1', () => {
    const { tone } = run(makeCircuit())
    expect(tone!.waveform.v1[0]).toBeCloseTo(0, 9)
    expect(tone!.waveform.v1[1]).toBeGreaterThan(0)
    const { re, im } = tone!.harmonicsAtInput[0]!
    expect(im).toBeLessThan(0)
    expect(Math.abs(re)).toBeLessThan(0.3 * Math.abs(im))
  })

  it('reports the current of network, gain pair and load at the output', () => {
    const unloaded = run(makeCircuit())
    const loaded = run(makeCircuit({ load: { resistance: 1e3 } }))
    const { vo, v1 } = unloaded.tone!.waveform
    expect(loaded.figures!.frequency).toBe(unloaded.figures!.frequency)
    expect(loaded.figures!.peakOutputCurrent! - unloaded.figures!.peakOutputCurrent!).toBeGreaterThan(5e-3)
    // The network's current is C·v1' + v1/R, the gain pair's vo/(Rf + Rg).
    const step = 1 / unloaded.tone!.frequency / vo.length
    const current = vo.map((value, n) => {
      const slope = (v1[(n + 1) % vo.length]! - v1[(n + vo.length - 1) % vo.length]!) / (2 * step)
      return Math.abs(16e-9 * slope + v1[n]! / 10e3 + value / 35e3)
    })
    expect(unloaded.figures!.peakOutputCurrent! / Math.max(...current)).toBeCloseTo(1, 2)
  })

  it('records the filament and settles on the gain that sustains the loop', () => {
    const circuit = makeCircuit({
      gain: { feedbackR: 430, groundR: 150 },
      supply: { positive: 13.5, negative: 13.5 },
      amplitudeControl: quickLamp,
    })
    const { control, figures } = run(circuit, 0.25)
    expect(control).toMatchObject({ name: 'Filament temperature', unit: 'K' })
    expect(control!.values[0]).toBe(300)
    const hotR = 150 * (control!.values.at(-1)! / 300) ** 1.2
    expect(1 + 430 / hotR).toBeCloseTo(figures!.criticalGain!, 1)
    expect(figures!.thd!).toBeLessThan(0.01)
  })
})

describe('scaling', () => {
  it('leaves every figure alone when R·k and C/k', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 20, noNaN: true }), (k) => {
        const plain = run(makeCircuit())
        const scaled = run(
          makeCircuit({
            network: { seriesR: 1e4 * k, shuntR: 1e4 * k, seriesC: 16e-9 / k, shuntC: 16e-9 / k },
          }),
        )
        for (const key of [...settledKeys, 'frequency', 'timeTo90'] as FigureKey[])
          expect(difference(scaled, plain, key)).toBeLessThan(1e-7)
      }),
      { seed: 1, numRuns: 5 },
    )
  })

  it('stretches time and nothing else when C·k, gain-bandwidth/k and slew rate/k', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 20, noNaN: true }), (k) => {
        const plain = run(makeCircuit({ amplifier: { slewRate: 4e4 } }))
        const scaled = run(
          makeCircuit({
            network: { seriesC: 16e-9 * k, shuntC: 16e-9 * k },
            amplifier: { gainBandwidth: 1e6 / k, slewRate: 4e4 / k },
          }),
          0.02 * k,
          fromOffset,
          10e-6 * k,
        )
        for (const key of settledKeys) expect(difference(scaled, plain, key)).toBeLessThan(1e-7)
        expect(difference(scaled, plain, 'frequency', 1 / k)).toBeLessThan(1e-8)
        expect(difference(scaled, plain, 'timeTo90', k)).toBeLessThan(1e-7)
      }),
      { seed: 2, numRuns: 5 },
    )
  })

  it.each([
    ['rails', makeCircuit()],
    ['diodes', makeCircuit({ amplitudeControl: diodes })],
  ])('mirrors the waveform when the offset changes sign, limited by %s', (_name, circuit) => {
    const mirrored = run({
      ...circuit,
      amplifier: { ...circuit.amplifier, offset: -circuit.amplifier.offset },
    })
    const { vo } = run(circuit)
    expect(Math.max(...vo.map((value, n) => Math.abs(value + mirrored.vo[n]!)))).toBeLessThan(1e-9)
  })
})

describe('stimulus', () => {
  it('starts from the kick on the shunt C', () => {
    const { v1, figures } = run(makeCircuit(), 0.02, { kind: 'kick', voltage: 0.4 })
    expect(v1[0]).toBe(0.4)
    expect(figures!.timeTo90!).toBeLessThan(run(makeCircuit()).figures!.timeTo90!)
  })

  it('follows rails that come up one after the other', () => {
    const ramp: Stimulus = {
      kind: 'ramp',
      positive: { delay: 1e-3, riseTime: 5e-3 },
      negative: { delay: 8e-3, riseTime: 2e-3 },
    }
    const steady = run(makeCircuit(), 0.04)
    const ramped = run(makeCircuit(), 0.04, ramp)
    expect(ramped.status).toBe('complete')
    for (const key of settledKeys) expect(difference(ramped, steady, key)).toBeLessThan(1e-5)
    const negativeRail = (t: number) => Math.max(0, 9 * Math.min(1, Math.max(0, (t - 8e-3) / 2e-3)) - 1.5)
    const positiveRail = (t: number) => Math.max(0, 9 * Math.min(1, Math.max(0, (t - 1e-3) / 5e-3)) - 1.5)
    ramped.vo.forEach((value, n) => {
      expect(value).toBeGreaterThanOrEqual(-negativeRail(n * 10e-6) - 1e-9)
      expect(value).toBeLessThanOrEqual(positiveRail(n * 10e-6) + 1e-9)
    })
  })

  it('follows rails that rise faster than the amplifier can slew', () => {
    const ramp: Stimulus = {
      kind: 'ramp',
      positive: { delay: 0, riseTime: 1e-5 },
      negative: { delay: 0, riseTime: 0 },
    }
    const { vo, modes, status } = run(makeCircuit({ amplifier: { offset: 0.05, slewRate: 2e4 } }), 0.02, ramp)
    expect(status).toBe('complete')
    expect(modes.some(({ mode }) => mode === 'slewUp')).toBe(true)
    for (let n = 1; n < vo.length; n++)
      expect(Math.abs(vo[n]! - vo[n - 1]!)).toBeLessThanOrEqual(2e4 * 10e-6 * (1 + 1e-6))
  })
})

describe('modes', () => {
  it('are all five reached by a slew-limited circuit', () => {
    const { modes, figures } = run(makeCircuit({ amplifier: { slewRate: 3e4 } }), 0.04)
    const seen = new Set<Mode>(modes.map(({ mode }) => mode))
    expect([...seen].sort()).toEqual(['heldHigh', 'heldLow', 'linear', 'slewDown', 'slewUp'])
    expect(figures!.slewUp!).toBeGreaterThan(0.1)
    expect(figures!.frequency!).toBeLessThan(0.9 * figures!.linearFrequency!)
  })

  it('never move the output faster than the slew rate', () => {
    const { vo, sampleInterval } = run(makeCircuit({ amplifier: { slewRate: 3e4 } }), 0.04, fromOffset, 2e-6)
    for (let n = 1; n < vo.length; n++)
      expect(Math.abs(vo[n]! - vo[n - 1]!)).toBeLessThanOrEqual(3e4 * sampleInterval * (1 + 1e-7))
  })
})
