import { describe, expect, it } from 'vitest'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { simulate, simulateRun, type Stimulus } from '#sim/index.ts'
import { diodes, makeCircuit, quickLamp } from '#tests/sim/support/circuits.ts'

const fromOffset: Stimulus = { kind: 'offset' }
const automatic = { duration: null, sampleInterval: null }

function runOf(
  circuit: Circuit,
  stimulus = fromOffset,
  timing: { duration: number | null; sampleInterval: number | null } = automatic,
) {
  const run = simulateRun({ circuit, stimulus, timing })
  if ('kind' in run) throw new Error(run.sentence)
  return run
}

describe('a record without settled figures says why', () => {
  it.each([
    [
      'it dies out',
      makeCircuit({ gain: { feedbackR: 19e3 } }),
      /^It dies out: a closed-loop gain of 2\.9 is not above/,
    ],
    [
      'a cold lamp dies out',
      makeCircuit({ gain: { feedbackR: 290, groundR: 150 }, amplitudeControl: quickLamp }),
      /^It dies out/,
    ],
    ['nothing disturbs it', makeCircuit({ amplifier: { offset: 0 } }), /^Nothing sets it going/],
    ['no gain suffices', makeCircuit({ amplifier: { gainBandwidth: 500 } }), /no closed-loop gain sustains/],
    [
      'it rests at a rail',
      makeCircuit({ gain: { feedbackR: 1e7 }, amplifier: { offset: 0.05 } }),
      /rests at the upper rail/,
    ],
  ])('%s', (_name, circuit, sentence) => {
    const { status, figures, tone, unsettled } = runOf(circuit)
    expect(status).toBe('complete')
    expect(unsettled).toMatch(sentence)
    expect(tone).toBeNull()
    expect(figures!.frequency).toBeNull()
    expect(figures!.timeTo90).toBeNull()
    expect(figures!.growthRate).toBeTypeOf('number')
  })

  it('the record is too short', () => {
    const circuit = makeCircuit({ gain: { feedbackR: 20.2e3 } })
    const { unsettled } = runOf(circuit, fromOffset, { duration: 0.06, sampleInterval: 10e-6 })
    expect(unsettled).toMatch(/ends before the level has settled: lengthen the duration/)
    const shorter = runOf(circuit, fromOffset, { duration: 1e-4, sampleInterval: 1e-6 })
    expect(shorter.unsettled).toMatch(/ends within the first cycles/)
  })

  it('the record ends before the supplies are up', () => {
    const late = { delay: 1, riseTime: 0 }
    const stimulus: Stimulus = { kind: 'ramp', positive: late, negative: { delay: 0, riseTime: 0 } }
    const { unsettled } = runOf(makeCircuit(), stimulus, { duration: 0.02, sampleInterval: 10e-6 })
    expect(unsettled).toMatch(/^The record of 20\sms ends before the supplies are up at 1\ss: lengthen/)
  })

  it('a short record that ends slewing, or held but not at rest, is only too short', () => {
    const slewing = runOf(
      makeCircuit({ amplifier: { slewRate: 3e3 } }),
      { kind: 'kick', voltage: 3 },
      { duration: 0.5e-3, sampleInterval: 1e-6 },
    )
    expect(slewing.modes.at(-1)!.mode).toBe('slewUp')
    expect(slewing.unsettled).toMatch(/ends within the first cycles/)
    // Independent computation: held from 41.4 µs to 1.634 ms, then it slews to the other rail.
    const held = runOf(makeCircuit({ gain: { feedbackR: 1e6 } }), fromOffset, {
      duration: 1.5e-3,
      sampleInterval: 1e-6,
    })
    expect(held.modes.at(-1)!.mode).toBe('heldHigh')
    expect(held.unsettled).toMatch(/ends within the first cycles/)
  })

  it('a kicked loop that hardly grows is not taken for settled', () => {
    const circuit = makeCircuit({ gain: { feedbackR: 20.0008e3 } })
    const { unsettled } = runOf(
      circuit,
      { kind: 'kick', voltage: 0.5 },
      { duration: 0.1, sampleInterval: 10e-6 },
    )
    expect(unsettled).toMatch(/before the level has settled/)
  })
})

describe('stopping', () => {
  it('returns the samples computed so far', () => {
    let asked = 0
    const seen: number[] = []
    const circuit = makeCircuit()
    const options = { stimulus: fromOffset, duration: 0.05, sampleInterval: 10e-6 }
    const stopped = simulate(circuit, {
      ...options,
      onProgress: (done) => seen.push(done),
      shouldStop: () => ++asked > 5,
    })
    expect(stopped.status).toBe('stopped')
    expect(stopped.reason?.kind).toBe('stopped')
    expect(stopped.figures).toBeNull()
    expect(stopped.vo.length).toBeGreaterThan(100)
    expect(stopped.vo.length).toBeLessThan(5000)
    const whole = simulate(circuit, options)
    expect([...stopped.vo]).toEqual([...whole.vo.slice(0, stopped.vo.length)])
    expect(seen).toEqual([...seen].sort((a, b) => a - b))
  })
})

describe('failure is data', () => {
  it('for inputs that the schema refuses', () => {
    const circuit = makeCircuit({ network: { seriesR: -1 } })
    expect(simulateRun({ circuit, stimulus: fromOffset, timing: automatic })).toEqual({
      kind: 'invalid',
      path: ['circuit', 'network', 'seriesR'],
      sentence: 'Series R must be greater than zero.',
    })
    for (const nonsense of [null, 7, 'circuit', {}, { circuit: {} }])
      expect(simulateRun(nonsense)).toMatchObject({ kind: 'invalid' })
  })

  it.each([
    [0, 1e-6],
    [NaN, 1e-6],
    [Infinity, 1e-6],
    [1, 0],
    [1, -1],
    [1, 1e-9],
  ])('for a duration of %d and a sample interval of %d', (duration, sampleInterval) => {
    const { status, reason } = simulate(makeCircuit(), { stimulus: fromOffset, duration, sampleInterval })
    expect(status).toBe('failed')
    expect(reason).toMatchObject({ kind: 'invalid', path: [expect.anything(), expect.anything()] })
  })

  it('for an amplifier too fast to follow, at once', () => {
    const { status, reason, cost, vo } = runOf(makeCircuit({ amplifier: { gainBandwidth: 1e9 } }))
    expect(status).toBe('failed')
    expect(reason).toMatchObject({ kind: 'solver', path: ['circuit', 'amplifier', 'gainBandwidth'] })
    expect(reason!.sentence).toMatch(/too fast to follow/)
    expect(cost.evaluations).toBe(0)
    expect(vo).toHaveLength(0)
  })
})

/** Corners of what the schema accepts. Nothing hangs, nothing throws, and each ends in figures or in a sentence. */
describe('extreme circuits', () => {
  const ramp: Stimulus = {
    kind: 'ramp',
    positive: { delay: 0, riseTime: 0 },
    negative: { delay: 5e-3, riseTime: 1e-3 },
  }
  it.each<[string, Circuit, Stimulus?]>([
    ['an amplifier below the oscillator', makeCircuit({ amplifier: { gainBandwidth: 300 } })],
    [
      'an amplifier near the oscillator',
      makeCircuit({ gain: { feedbackR: 60e3 }, amplifier: { gainBandwidth: 3e3 } }),
    ],
    ['near-critical gain', makeCircuit({ gain: { feedbackR: 20.01e3 } }), { kind: 'kick', voltage: 2.4 }],
    ['gain 11', makeCircuit({ gain: { feedbackR: 100e3 } })],
    [
      'gain 11 with a tiny slew rate',
      makeCircuit({ gain: { feedbackR: 100e3 }, amplifier: { slewRate: 1e3 } }),
    ],
    ['1 GΩ everywhere', makeCircuit({ network: { seriesR: 1e9, shuntR: 1e9 } })],
    ['1 GΩ in series', makeCircuit({ network: { seriesR: 1e9 } })],
    ['picofarads', makeCircuit({ network: { seriesC: 1e-12, shuntC: 1e-12 } })],
    ['the least rails', makeCircuit({ supply: { positive: 1.500001, negative: 1.500001 } })],
    ['rails of one side only', makeCircuit({ supply: { positive: 1.6, negative: 100 } })],
    ['a rail that comes late', makeCircuit(), ramp],
    ['a huge kick', makeCircuit(), { kind: 'kick', voltage: -100 }],
    [
      'fierce diodes',
      makeCircuit({
        amplitudeControl: { ...diodes, saturationCurrent: 1e-18, thermalVoltage: 1e-3 } as typeof diodes,
      }),
    ],
    [
      'a filament of no mass',
      makeCircuit({
        gain: { feedbackR: 430, groundR: 150 },
        amplitudeControl: { ...quickLamp, thermalCapacity: 1e-9 } as typeof quickLamp,
      }),
    ],
  ])(
    '%s',
    (_name, circuit, stimulus) => {
      const run = runOf(circuit, stimulus)
      const told = run.reason?.sentence ?? run.unsettled
      if (told) expect(told).toMatch(/\.$/)
      else expect(run.figures!.level!).toBeGreaterThan(0)
      expect(run.vo.every(Number.isFinite)).toBe(true)
    },
    60_000,
  )
})
