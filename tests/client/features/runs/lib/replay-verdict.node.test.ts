import { describe, expect, it } from 'vitest'
import { formatDifference } from '#client/features/runs/lib/format-difference.ts'
import { replayInputs } from '#client/features/runs/lib/replay-inputs.ts'
import { replayVerdict } from '#client/features/runs/lib/replay-verdict.ts'
import { compareReplay } from '#shared/replay.ts'
import { makeFigures, makeRun } from '#tests/client/features/runs/support/runs.ts'

const { record } = makeRun()
const ramp = (last: number) => Float64Array.of(0, 1, 2, last)
const result = (last: number, figures = makeFigures()) => ({
  figures,
  sampleInterval: record.sampleInterval,
  columns: [ramp(last), ramp(4), ramp(4)],
})
const verdict = (a: ReturnType<typeof result>, b: ReturnType<typeof result>) =>
  replayVerdict(compareReplay(a, b), record)

describe('replayVerdict', () => {
  it('says when the two are the same to the last bit', () => {
    expect(verdict(result(4), result(4))).toMatchObject({
      passes: true,
      title: 'It replays.',
      sentence: expect.stringContaining('to the last bit'),
    })
  })

  it('says when they agree within tolerance', () => {
    const close = verdict(result(4), result(4 + 1e-9))
    expect(close).toMatchObject({
      passes: true,
      sentence: expect.stringContaining('within their stated tolerances'),
    })
  })

  it('names what differs: figures, waveform, how much and when', () => {
    const far = verdict(result(4), result(3.5, makeFigures({ frequency: 1000, level: 8 })))
    expect(far.passes).toBe(false)
    // By hand: 0.5 V of a 4 V peak is 12.5 %, two digits 13 %; fourth sample of 1 ms at 3 ms.
    expect(far.sentence).toBe(
      'Outside tolerance: Frequency and Level. The waveform of the output deviates by up to 500\u2009mV, 13\u2009% of its peak, at 3\u2009ms.',
    )
  })

  it('says when the waveforms could not be compared', () => {
    expect(verdict(result(4), { ...result(4), sampleInterval: 1 }).sentence).toContain('different grids')
  })
})

describe('replayInputs', () => {
  it('pins the grid that the engine chose, and only that', () => {
    const run = makeRun()
    expect(replayInputs(run).timing).toEqual({ duration: 3 * 1e-3, sampleInterval: 1e-3 })
    expect(replayInputs(run).circuit).toBe(run.inputs.circuit)
    const stated = makeRun({ inputs: { ...run.inputs, timing: { duration: 0.0031, sampleInterval: null } } })
    expect(replayInputs(stated).timing).toEqual({ duration: 0.0031, sampleInterval: 1e-3 })
  })
})

describe('formatDifference', () => {
  it('shrinks into a prefix where there is a unit, into a power of ten where there is none', () => {
    expect(formatDifference('level', 1.234e-13)).toBe('120\u2009fV')
    expect(formatDifference('gain', -3.2e-9)).toBe('−3.2 × 10⁻⁹')
    expect(formatDifference('thd', 1e-9, { signed: true })).toBe('+1.0 × 10⁻⁷\u2009%')
    expect(formatDifference('thd', 0.0012)).toBe('0.12\u2009%')
    expect(formatDifference('gain', 0)).toBe('0')
    expect(formatDifference('gain', null)).toBe('–')
  })
})
