import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  advance,
  follow,
  modeAt,
  nextChange,
  previousChange,
  speedChoices,
  usualSpeed,
} from '#client/features/runs/lib/playhead.ts'
import type { RunModeSpan } from '#shared/schemas/run.ts'

const modes: RunModeSpan[] = [
  { mode: 'linear', start: 0, end: 1 },
  { mode: 'heldHigh', start: 1, end: 1.5 },
  { mode: 'linear', start: 1.5, end: 2 },
  { mode: 'heldLow', start: 2, end: 3 },
]

describe('modeAt', () => {
  it('gives a span from its start up to, not including, its end', () => {
    expect([0, 0.99, 1, 1.49, 1.5, 2, 3].map((time) => modeAt(modes, time))).toEqual([
      'linear',
      'linear',
      'heldHigh',
      'heldHigh',
      'linear',
      'heldLow',
      'heldLow',
    ])
  })

  it('takes the loop where nothing is said', () => {
    expect(modeAt([], 1)).toBe('linear')
    const gap: RunModeSpan[] = [
      { mode: 'heldHigh', start: 0, end: 1 },
      { mode: 'heldLow', start: 2, end: 3 },
    ]
    expect(modeAt(gap, 1.5)).toBe('linear')
  })
})

describe('stepping', () => {
  it('goes from change to change and stops at the last', () => {
    const steps: number[] = []
    for (let at: number | null = 0; at !== null; at = nextChange(modes, at)) steps.push(at)
    expect(steps).toEqual([0, 1, 1.5, 2])
  })

  it('goes back the same way', () => {
    expect(previousChange(modes, 3)).toBe(2)
    expect(previousChange(modes, 2)).toBe(1.5)
    expect(previousChange(modes, 1.2)).toBe(1)
    expect(previousChange(modes, 0)).toBeNull()
  })

  it('agrees with a plain search for any spans', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 1, max: 1000 })),
        fc.integer({ min: 0, max: 1000 }),
        (cuts, at) => {
          const starts = [0, ...cuts.sort((a, b) => a - b)]
          const spans = starts.map((start, i) => ({
            mode: 'linear' as const,
            start,
            end: starts[i + 1] ?? 1001,
          }))
          expect(nextChange(spans, at)).toBe(starts.find((start) => start > at) ?? null)
          expect(previousChange(spans, at)).toBe(starts.findLast((start) => start < at) ?? null)
        },
      ),
    )
  })
})

describe('advance', () => {
  it('moves by elapsed time times speed and stops at the end', () => {
    expect(advance(0.01, 0.5, 1e-3, 1)).toBeCloseTo(0.0105, 15)
    expect(advance(0.9, 200, 1e-3, 1)).toBe(1)
  })
})

describe('speedChoices', () => {
  it('spans a tenth of a period to a quarter of the record a second, in decades', () => {
    // 1 kHz over 180 ms: 0.1 ms, 1 ms, 10 ms of record per second.
    expect(speedChoices(1e-3, 0.18)).toEqual([1e-4, 1e-3, 1e-2])
  })

  it('offers at least two even for a record shorter than a period', () => {
    expect(speedChoices(1, 1e-3)).toEqual([1e-4, 1e-3])
    expect(speedChoices(null, 0.5)).toEqual([1e-3, 1e-2, 1e-1])
  })

  it('begins at about one period a second', () => {
    expect(usualSpeed([1e-4, 1e-3, 1e-2], 1.01e-3)).toBe(1e-3)
    expect(usualSpeed([1e-4, 1e-3, 1e-2], null)).toBe(1e-3)
  })
})

describe('follow', () => {
  it('leaves a view that shows the playhead alone', () => {
    expect(follow([1, 2], 1.5, 10)).toEqual([1, 2])
  })

  it('turns the page when the playhead has left, without going past the record', () => {
    expect(follow([1, 2], 2.0625, 10)).toEqual([2, 3])
    expect(follow([8, 9.5], 9.9, 10)).toEqual([8.5, 10])
    expect(follow([5, 6], 0, 10)).toEqual([0, 1])
  })
})
