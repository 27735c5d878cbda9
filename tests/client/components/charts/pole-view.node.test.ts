import { describe, expect, it } from 'vitest'
import { poleView } from '#client/components/charts/pole-view.ts'

describe('poleView', () => {
  it('shows the pair that makes the tone and leaves the amplifier’s own pole to words', () => {
    const pair = [
      { re: 61.7, im: 6221 },
      { re: 61.7, im: -6221 },
    ]
    const far = { re: -2.08e6, im: 0 }
    const view = poleView([far, ...pair])
    expect(view.shown).toEqual(pair)
    expect(view.far).toEqual([far])
    expect(view.real).toBeGreaterThan(61.7)
    expect(view.imaginary).toBeGreaterThan(6221)
  })

  it('keeps a width of its own where the pair lies on the axis or all poles are real', () => {
    expect(
      poleView([
        { re: 0, im: 1000 },
        { re: 0, im: -1000 },
      ]).real,
    ).toBeGreaterThan(0)
    const view = poleView([
      { re: -100, im: 0 },
      { re: 300, im: 0 },
    ])
    expect(view.imaginary).toBeGreaterThan(0)
    expect(view.real).toBeGreaterThan(300)
  })
})
