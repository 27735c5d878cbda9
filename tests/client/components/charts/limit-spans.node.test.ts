import { describe, expect, it } from 'vitest'
import { limitSpans, mergedSpans } from '#client/components/charts/limit-spans.ts'

describe('limitSpans', () => {
  it('tells held from slewing and leaves the linear mode out', () => {
    expect(
      limitSpans([
        { mode: 'linear', start: 0, end: 1 },
        { mode: 'slewUp', start: 1, end: 2 },
        { mode: 'heldHigh', start: 2, end: 3 },
        { mode: 'slewDown', start: 3, end: 4 },
        { mode: 'heldLow', start: 4, end: 5 },
      ]),
    ).toEqual([
      { kind: 'slew', start: 1, end: 2 },
      { kind: 'held', start: 2, end: 3 },
      { kind: 'slew', start: 3, end: 4 },
      { kind: 'held', start: 4, end: 5 },
    ])
  })
})

describe('mergedSpans', () => {
  const held = [0, 10, 20, 30].map((start) => ({ kind: 'held' as const, start, end: start + 2 }))

  it('keeps spans apart while pixels can, and only those of the view', () => {
    expect(mergedSpans(held, 'held', [5, 25], 1)).toEqual([
      [10, 12],
      [20, 22],
    ])
  })

  it('joins what lies closer than the gap', () => {
    expect(mergedSpans(held, 'held', [0, 40], 9)).toEqual([[0, 32]])
    expect(mergedSpans(held, 'slew', [0, 40], 9)).toEqual([])
  })
})
