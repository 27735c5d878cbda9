import { describe, expect, it } from 'vitest'
import { figureKeys, type Figures } from '#shared/figures.ts'
import { compareColumn, compareFigure, compareReplay, waveformTolerance } from '#shared/replay.ts'

const figures = (changes: Partial<Figures> = {}): Figures => ({
  ...(Object.fromEntries(figureKeys.map((key) => [key, null])) as Figures),
  gain: 3.05,
  frequency: 1000,
  level: 7.5,
  ...changes,
})
const column = (...values: number[]) => Float64Array.from(values)

describe('compareFigure', () => {
  it('allows the wider of the relative and the absolute tolerance', () => {
    // Frequency: 1e-6 of 1000 Hz is 1 mHz, by hand.
    expect(compareFigure('frequency', 1000, 1000.0009)).toMatchObject({ passes: true })
    expect(compareFigure('frequency', 1000, 1000.0011)).toMatchObject({ passes: false })
    expect(compareFigure('frequency', 1000, 1000.0009).tolerance).toBeCloseTo(1e-3, 15)
    // Mean: 1e-4 of 2 mV is 0.2 µV, so the absolute 1 µV governs.
    expect(compareFigure('mean', 2e-3, 2e-3 + 0.9e-6).passes).toBe(true)
    expect(compareFigure('mean', 2e-3, 2e-3 + 1.1e-6).passes).toBe(false)
  })

  it('gives the difference with its sign, replayed less stored', () => {
    expect(compareFigure('level', 7.5, 7.25).difference).toBe(-0.25)
    expect(compareFigure('low', -7.5, -7.25).tolerance).toBeCloseTo(7.5e-5, 15)
  })

  it('passes a figure that is missing in both and fails one that is missing in one', () => {
    expect(compareFigure('thd', null, null)).toMatchObject({
      passes: true,
      difference: null,
      tolerance: null,
    })
    expect(compareFigure('thd', null, 0.01).passes).toBe(false)
    expect(compareFigure('thd', 0.01, null).passes).toBe(false)
  })

  it('never passes what is not a number', () => {
    expect(compareFigure('level', 7.5, Number.NaN).passes).toBe(false)
  })
})

describe('compareColumn', () => {
  it('finds the largest deviation, its time and its share of the peak', () => {
    // By hand: differences 0, 0.25, −0.5, 0 V; peak 4 V; third sample at 2 × 0.5 ms.
    const result = compareColumn(column(0, 2, -4, 1), column(0, 2.25, -4.5, 1), 0.5e-3)
    expect(result).toEqual({ deviation: 0.5, time: 1e-3, peak: 4, relative: 0.125, passes: false })
  })

  it('passes up to the stated share of the peak and not beyond', () => {
    expect(compareColumn(column(8, -8), column(8 * (1 + 0.9 * waveformTolerance), -8), 1).passes).toBe(true)
    expect(compareColumn(column(8, -8), column(8 * (1 + 1.1 * waveformTolerance), -8), 1).passes).toBe(false)
  })

  it('passes silence against silence and fails a deviation from silence', () => {
    expect(compareColumn(column(0, 0), column(0, 0), 1)).toMatchObject({ relative: 0, passes: true })
    expect(compareColumn(column(0, 0), column(0, 1e-9), 1)).toMatchObject({ passes: false })
  })

  it('takes a value that is not a number for an infinite deviation', () => {
    expect(compareColumn(column(1, 1), column(1, Number.NaN), 1)).toMatchObject({
      deviation: Infinity,
      time: 1,
      passes: false,
    })
  })
})

describe('compareReplay', () => {
  const stored = { figures: figures(), sampleInterval: 1e-6, columns: [column(0, 1), column(0, 0.5)] }

  it('passes a result against itself, one row for each figure and column', () => {
    const result = compareReplay(stored, structuredClone(stored))
    expect(result.passes).toBe(true)
    expect(result.figures.map((row) => row.key)).toEqual(figureKeys)
    expect(result.columns).toHaveLength(2)
  })

  it('fails when one figure or one column fails', () => {
    expect(compareReplay(stored, { ...stored, figures: figures({ level: 7.6 }) }).passes).toBe(false)
    expect(compareReplay(stored, { ...stored, columns: [column(0, 1), column(0, 0.6)] }).passes).toBe(false)
  })

  it('does not compare waveforms on different grids, and does not pass them', () => {
    expect(compareReplay(stored, { ...stored, sampleInterval: 2e-6 })).toMatchObject({
      columns: null,
      passes: false,
    })
    expect(
      compareReplay(stored, { ...stored, columns: [column(0, 1, 2), column(0, 1, 2)] }).columns,
    ).toBeNull()
    expect(compareReplay(stored, { ...stored, columns: [column(0, 1)] }).columns).toBeNull()
  })
})
