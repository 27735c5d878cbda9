import { beforeAll, describe, expect, it } from 'vitest'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { simulate, smallSignal, type Simulation } from '#sim/index.ts'
import reference from './reference-values.json' with { type: 'json' }

/**
 * Cases computed outside this project with general-purpose scientific Python by two methods that agree to the digits
 * stated in `reference-values.json`. Bounds stand a small factor above what the engine reaches: frequency 8e-11
 * (relative), harmonics 1.1e-7 of the fundamental (the fold-back of the 4096-point grid), mean 4.4e-7 V, THD 1.7e-7,
 * shares 1.1e-10, time to 90 % and first rail 2.5e-10 (relative).
 */
const bound = {
  frequency: 5e-10,
  harmonic: 3e-7,
  mean: 1e-6,
  thd: 3e-7,
  share: 1e-9,
  time: 2e-9,
  level: 1e-9,
}

function relative(value: number | null | undefined, expected: number): number {
  return Math.abs((value ?? NaN) / expected - 1)
}

function run(circuit: unknown, duration: number): Simulation {
  return simulate(circuit as Circuit, { stimulus: { kind: 'offset' }, duration, sampleInterval: 10e-6 })
}

function largestHarmonicError(simulation: Simulation, magnitudes: readonly number[]): number {
  const { harmonics } = simulation.tone!
  return (
    Math.max(...harmonics.map(({ re, im }, n) => Math.abs(Math.hypot(re, im) - magnitudes[n]!))) /
    magnitudes[0]!
  )
}

describe.each(['A', 'F', 'H', 'J', 'L'] as const)('case %s', (name) => {
  it('has its growth rate and frequency at zero signal', () => {
    const { circuit, result } = reference.cases[name]
    const linear = smallSignal(circuit as Circuit)
    expect(relative(linear.growthRate, result.growthRate)).toBeLessThan(1e-12)
    expect(relative(linear.frequency, result.linearFrequency)).toBeLessThan(1e-12)
  })
})

describe.each([
  ['A', 0.125],
  ['F', 0.02],
  ['H', 0.03],
] as const)('case %s, clipped by its rails, over %d s', (name, duration) => {
  const { circuit, result } = reference.cases[name]
  const { steadyState, startUpFromRest } = result
  let simulation: Simulation
  beforeAll(() => {
    simulation = run(circuit, duration)
  })

  it('settles to the tone', () => {
    const { figures } = simulation
    expect(simulation.unsettled).toBeNull()
    expect(relative(figures?.frequency, steadyState.frequency)).toBeLessThan(bound.frequency)
    expect(relative(figures?.high, steadyState.high)).toBeLessThan(bound.level)
    expect(relative(figures?.low, steadyState.low)).toBeLessThan(bound.level)
    expect(Math.abs(figures!.mean! - steadyState.mean)).toBeLessThan(bound.mean)
    expect(Math.abs(figures!.thd! - steadyState.thd2to20)).toBeLessThan(bound.thd)
    expect(largestHarmonicError(simulation, steadyState.harmonicMagnitudes)).toBeLessThan(bound.harmonic)
  })

  it('is held at each rail for the share of the period', () => {
    const { figures } = simulation
    expect(Math.abs(figures!.heldHigh! - steadyState.heldHigh)).toBeLessThan(bound.share)
    expect(Math.abs(figures!.heldLow! - steadyState.heldLow)).toBeLessThan(bound.share)
    expect(figures!.slewUp! + figures!.slewDown!).toBe(steadyState.slewing)
  })

  it('starts in the time', () => {
    const firstRail = simulation.modes.find(({ mode }) => mode === 'heldHigh' || mode === 'heldLow')?.start
    expect(relative(simulation.figures?.timeTo90, startUpFromRest.timeTo90)).toBeLessThan(bound.time)
    expect(relative(firstRail, startUpFromRest.firstRail)).toBeLessThan(bound.time)
  })

  it('has its network node between its extremes', () => {
    const { v1 } = simulation.tone!.waveform
    expect(Math.abs(Math.max(...v1) - steadyState.v1High)).toBeLessThan(2e-4)
    expect(Math.abs(Math.min(...v1) - steadyState.v1Low)).toBeLessThan(2e-4)
  })
})

describe('case J, limited by diodes', () => {
  it('settles to the tone', () => {
    const { circuit, result } = reference.cases.J
    const simulation = run(circuit, 0.04)
    const { figures } = simulation
    expect(relative(figures?.gain, result.smallSignalGain)).toBeLessThan(1e-12)
    expect(relative(figures?.frequency, result.steadyState.frequency)).toBeLessThan(bound.frequency)
    expect(relative(figures?.high, result.steadyState.high)).toBeLessThan(bound.level)
    expect(relative(figures?.low, result.steadyState.low)).toBeLessThan(bound.level)
    expect(Math.abs(figures!.mean! - result.steadyState.mean)).toBeLessThan(1e-9)
    expect(Math.abs(figures!.thd! - result.steadyState.thd2to20)).toBeLessThan(1e-8)
    expect(largestHarmonicError(simulation, result.steadyState.harmonicMagnitudes)).toBeLessThan(3e-8)
    expect(relative(figures?.timeTo90, result.startUpFromRest.timeTo90)).toBeLessThan(bound.time)
  })
})

/**
 * The envelope of L dies away at 8.15 1/s only: after 1.6 s some 1e-6 of it is left, which is what these bounds allow.
 */
describe('case L, held by a lamp', () => {
  it('settles to the tone and the filament temperature', () => {
    const { circuit, result } = reference.cases.L
    const simulation = run(circuit, 1.6)
    const { figures } = simulation
    expect(relative(figures?.frequency, result.steadyState.frequency)).toBeLessThan(1e-8)
    expect(relative(figures?.high, result.steadyState.high)).toBeLessThan(5e-6)
    expect(relative(figures?.low, result.steadyState.low)).toBeLessThan(5e-6)
    expect(relative(figures?.rms, result.steadyState.rms)).toBeLessThan(5e-6)
    expect(Math.abs(figures!.thd! - result.steadyState.thd2to10)).toBeLessThan(1e-6)
    expect(largestHarmonicError(simulation, result.steadyState.harmonicMagnitudes)).toBeLessThan(5e-6)
    const lastPeriods = simulation.control!.values.slice(-10_000)
    const mean = lastPeriods.reduce((sum, value) => sum + value, 0) / lastPeriods.length
    expect(relative(mean, result.steadyState.filamentTemperature)).toBeLessThan(1e-5)
  }, 60_000)
})
