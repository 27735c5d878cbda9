import { describe, expect, it } from 'vitest'
import { compareFigures, compareInputs } from '#client/features/runs/lib/compare-runs.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import { makeFigures, makeRun } from '#tests/client/features/runs/support/runs.ts'

const { inputs } = makeRun()

describe('compareInputs', () => {
  it('finds no difference between a run and itself', () => {
    expect(compareInputs(inputs, structuredClone(inputs)).filter((pair) => pair.differs)).toEqual([])
  })

  it('names the inputs that differ, as they are shown', () => {
    const other = structuredClone(inputs)
    other.circuit.network.seriesR = 2200
    other.timing.duration = 0.06
    const differing = compareInputs(inputs, other).filter((pair) => pair.differs)
    expect(differing).toEqual([
      { group: 'Network', name: 'Series R', a: '10\u2009kΩ', b: '2.2\u2009kΩ', differs: true },
      { group: 'Record', name: 'Duration', a: 'chosen by the engine', b: '60\u2009ms', differs: true },
    ])
  })

  it('sees a difference that rounding hides', () => {
    const other = structuredClone(inputs)
    other.circuit.gain.feedbackR *= 1 + 1e-9
    expect(compareInputs(inputs, other).find((pair) => pair.name === 'Feedback R')?.differs).toBe(true)
  })

  it('keeps what only one of the two has within its group', () => {
    const diodes: RunInputs = structuredClone(inputs)
    diodes.circuit.amplitudeControl = {
      kind: 'diodes',
      seriesR: 10e3,
      shuntedR: 10.5e3,
      saturationCurrent: 4e-9,
      emissionCoefficient: 1.9,
      thermalVoltage: 0.02585,
    }
    const pairs = compareInputs(inputs, diodes)
    const control = pairs.filter((pair) => pair.group === 'Amplitude control')
    expect(control.map((pair) => pair.a)).toEqual(['none, the rails clip', null, null, null, null, null])
    expect(control.every((pair) => pair.differs)).toBe(true)
    const groups = pairs.map((pair) => pair.group)
    expect(groups.filter((group, index) => group !== groups[index - 1])).toHaveLength(new Set(groups).size)
  })
})

describe('compareFigures', () => {
  const pair = (key: string, a: ReturnType<typeof makeFigures>, b: ReturnType<typeof makeFigures>) =>
    compareFigures(a, b).find((row) => row.key === key)

  it('gives the second less the first, also as a share of the first', () => {
    // By hand: −8 − (−10) = 2; 2/|−10| = 0.2.
    const row = pair('low', makeFigures({ low: -10 }), makeFigures({ low: -8 }))
    expect(row).toEqual({ key: 'low', a: -10, b: -8, difference: 2, relative: 0.2, negligible: false })
  })

  it('gives no difference where a figure is missing, no share where the first is zero', () => {
    expect(pair('thd', makeFigures({ thd: null }), makeFigures())).toMatchObject({
      difference: null,
      relative: null,
    })
    expect(pair('mean', makeFigures({ mean: 0 }), makeFigures({ mean: 0.5 }))).toMatchObject({
      difference: 0.5,
      relative: null,
    })
  })
})
