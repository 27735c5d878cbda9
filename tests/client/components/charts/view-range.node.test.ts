import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { View } from '#client/components/charts/chart-types.ts'
import {
  clampView,
  fractionOf,
  leastSpan,
  panView,
  timeAt,
  viewContaining,
  zoomView,
} from '#client/components/charts/view-range.ts'

const whole: View = [0, 60e-3]
const least = leastSpan(2e-6)
const views = fc
  .tuple(fc.double({ min: 0, max: 0.05, noNaN: true }), fc.double({ min: 1e-4, max: 0.01, noNaN: true }))
  .map(([from, span]): View => [from, from + span])

describe('zoomView', () => {
  it('keeps the instant under the pointer where it is, away from the ends', () => {
    const view: View = [20e-3, 40e-3]
    const next = zoomView(view, 0.5, 25e-3, whole, least)
    expect(next[1] - next[0]).toBeCloseTo(10e-3, 12)
    expect(fractionOf(25e-3, next)).toBeCloseTo(fractionOf(25e-3, view), 12)
  })

  it('stops at the narrowest view and at the whole record', () => {
    const [from, to] = zoomView([0.01, 0.0101], 1e-9, 0.01005, whole, least)
    expect(to - from).toBeCloseTo(least, 12)
    expect(zoomView([0.01, 0.02], 1e9, 0.015, whole, least)).toEqual(whole)
  })

  it('never leaves the record', () => {
    fc.assert(
      fc.property(
        views,
        fc.double({ min: 0.01, max: 100, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (view, factor, share) => {
          const [from, to] = zoomView(view, factor, timeAt(share, view), whole, least)
          expect(from).toBeGreaterThanOrEqual(0)
          expect(to).toBeLessThanOrEqual(60e-3 * (1 + 1e-12))
          expect(to).toBeGreaterThan(from)
        },
      ),
    )
  })
})

describe('panView and viewContaining', () => {
  it('keeps the span and stops at either end', () => {
    expect(panView([10e-3, 20e-3], -1, whole)).toEqual([0, 10e-3])
    const [from, to] = panView([10e-3, 20e-3], 1, whole)
    expect([from, to]).toEqual([expect.closeTo(50e-3, 12), expect.closeTo(60e-3, 12)])
  })

  it('moves only as far as needed', () => {
    expect(viewContaining([10e-3, 20e-3], 15e-3, whole)).toEqual([10e-3, 20e-3])
    expect(viewContaining([10e-3, 20e-3], 25e-3, whole)).toEqual([
      expect.closeTo(15e-3, 12),
      expect.closeTo(25e-3, 12),
    ])
  })
})

describe('clampView', () => {
  it('widens what is too narrow about its middle', () => {
    const [from, to] = clampView([30e-3, 30e-3], whole, 1e-3)
    expect([from, to]).toEqual([expect.closeTo(29.5e-3, 12), expect.closeTo(30.5e-3, 12)])
  })
})
