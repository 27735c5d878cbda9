import { describe, expect, it } from 'vitest'
import { askedView, shownView } from '#client/features/start-up/lib/live-view.ts'

describe('the live view', () => {
  it('follows the end of the record when it was asked for up to the end', () => {
    const asked = askedView([10e-3, 60e-3], 60e-3)
    expect(asked).toEqual([10e-3, Infinity])
    expect(shownView(asked, 80e-3, 1e-6)).toEqual([10e-3, 80e-3])
  })

  it('keeps a span in the middle where it was', () => {
    const asked = askedView([10e-3, 20e-3], 60e-3)
    expect(shownView(asked, 80e-3, 1e-6)).toEqual([expect.closeTo(10e-3, 12), expect.closeTo(20e-3, 12)])
  })

  it('shows the whole of a record that ends before the span begins', () => {
    expect(shownView([30e-3, 40e-3], 20e-3, 1e-6)).toEqual([0, 20e-3])
  })
})
