import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { limits } from '#shared/limits.ts'
import { plan, simulate, smallSignal, type Failure, type Plan } from '#sim/index.ts'
import { mostEvaluations, predictedEvaluations } from '#sim/work.ts'
import { diodes, makeCircuit } from '#tests/sim/support/circuits.ts'

const automatic = { duration: null, sampleInterval: null }

function planned(...args: Parameters<typeof plan>): Plan {
  const result = plan(...args)
  if ('kind' in result) throw new Error(result.sentence)
  return result
}

function refused(...args: Parameters<typeof plan>): Failure {
  const result = plan(...args)
  if (!('kind' in result)) throw new Error('expected a refusal')
  return result
}

describe('plan', () => {
  it('shows the start-up and some settled periods', () => {
    const circuit = makeCircuit({ gain: { feedbackR: 20.2e3 } })
    const { duration, sampleInterval, samples } = planned(circuit, automatic, { kind: 'offset' })
    // The output is first held at 109.3 ms (case A of the reference values).
    expect(duration).toBeGreaterThan(0.125)
    expect(duration).toBeLessThan(0.25)
    expect(sampleInterval).toBe(5e-6)
    expect(samples).toBe(Math.round(duration / sampleInterval) + 1)
  })

  it('adds the delays of ramped rails', () => {
    const ramp = { delay: 0.2, riseTime: 0.1 }
    const stimulus = { kind: 'ramp', positive: ramp, negative: ramp } as const
    expect(planned(makeCircuit(), automatic, stimulus).duration).toBeGreaterThan(0.32)
  })

  it('shows a decay over some of its time constants', () => {
    const circuit = makeCircuit({ gain: { feedbackR: 19.9e3 } })
    const decay = 1 / -smallSignal(circuit).growthRate
    const { duration } = planned(circuit, automatic, { kind: 'offset' })
    expect(duration / decay).toBeGreaterThan(4)
    expect(duration / decay).toBeLessThan(10)
  })

  it('never chooses a record that would be refused as too much work, where that leaves enough to see', () => {
    const circuit = makeCircuit({
      network: { seriesC: 800e-9, shuntC: 800e-9 },
      amplifier: { gainBandwidth: 10e6 },
    })
    const { duration } = planned(circuit, automatic, { kind: 'offset' })
    const linear = smallSignal(circuit)
    expect(predictedEvaluations(circuit, linear, duration)).toBeLessThan(mostEvaluations)
    expect(duration * linear.frequency).toBeGreaterThan(8)
  })

  it('reckons with the faster amplifier while the diodes conduct', () => {
    const circuit = makeCircuit({ amplifier: { gainBandwidth: 20e6 }, amplitudeControl: diodes })
    const duration = 10e-3
    const { cost } = simulate(circuit, {
      stimulus: { kind: 'kick', voltage: 1 },
      duration,
      sampleInterval: 10e-6,
    })
    const predicted = predictedEvaluations(circuit, smallSignal(circuit), duration)
    expect(predicted / cost.evaluations).toBeGreaterThan(0.8)
    expect(predicted / cost.evaluations).toBeLessThan(2)
  })

  it('chooses few significant digits, 200 to 500 samples a period, and never more than is kept', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 6, noNaN: true }),
        fc.double({ min: 2.5, max: 6, noNaN: true }),
        (decade, gain) => {
          const r = 10 ** decade
          const circuit = makeCircuit({
            network: { seriesR: r, shuntR: r },
            gain: { feedbackR: 1e4 * (gain - 1) },
            amplifier: { gainBandwidth: 1e3 / (2 * Math.PI * r * 16e-9), slewRate: 1e9 },
          })
          const { duration, sampleInterval, samples } = planned(circuit, automatic, { kind: 'offset' })
          const period = 1 / (smallSignal(circuit).frequency || 1 / (2 * Math.PI * r * 16e-9))
          expect(samples).toBeLessThanOrEqual(limits.storedSamples)
          expect(Number(duration.toPrecision(2))).toBe(duration)
          expect(Number(sampleInterval.toPrecision(1))).toBe(sampleInterval)
          if (samples < limits.storedSamples / 2.5) expect(period / sampleInterval).toBeGreaterThan(150)
          expect(period / sampleInterval).toBeLessThan(2000)
        },
      ),
      { seed: 5, numRuns: 200 },
    )
  })

  it('keeps what the person states', () => {
    const timing = { duration: 0.06, sampleInterval: 2e-6 }
    expect(planned(makeCircuit(), timing, { kind: 'offset' })).toEqual({ ...timing, samples: 30_001 })
  })

  it('refuses a million periods', () => {
    const failure = refused(makeCircuit(), { duration: 1000, sampleInterval: null }, { kind: 'offset' })
    expect(failure).toMatchObject({ kind: 'invalid', path: ['timing', 'duration'] })
    expect(failure.sentence).toMatch(/periods/)
  })

  it('refuses more samples than are kept', () => {
    const failure = refused(makeCircuit(), { duration: 0.1, sampleInterval: 1e-8 }, { kind: 'offset' })
    expect(failure).toMatchObject({ kind: 'invalid', path: ['timing', 'sampleInterval'] })
    expect(failure.sentence).toMatch(/samples/)
  })

  it('refuses a duration shorter than a sample', () => {
    const failure = refused(makeCircuit(), { duration: 1e-6, sampleInterval: 1e-5 }, { kind: 'offset' })
    expect(failure).toMatchObject({ kind: 'invalid', path: ['timing', 'duration'] })
    expect(failure.sentence).toMatch(/shorter than one sample interval/)
  })
})
