import { describe, expect, it } from 'vitest'
import { closeUp } from '#client/features/start-up/lib/close-up.ts'
import { modeShares } from '#client/features/start-up/lib/mode-shares.ts'
import { figureKeys, type Figures } from '#shared/figures.ts'

const none = Object.fromEntries(figureKeys.map((key) => [key, null])) as Figures

describe('modeShares', () => {
  it('takes the settled period where there is one, and the rest is the loop’s', () => {
    const figures = { ...none, heldHigh: 0.1, heldLow: 0.2, slewUp: 0.05, slewDown: 0.15 }
    const { of, shares } = modeShares({ figures, modes: [] })
    expect(of).toBe('settled')
    expect(shares.linear).toBeCloseTo(0.5, 12)
  })

  it('otherwise adds up the spans of the record', () => {
    const modes = [
      { mode: 'linear' as const, start: 0, end: 6 },
      { mode: 'heldHigh' as const, start: 6, end: 7 },
      { mode: 'linear' as const, start: 7, end: 8 },
    ]
    expect(modeShares({ figures: none, modes })).toEqual({
      of: 'record',
      shares: { linear: 0.875, heldHigh: 0.125, heldLow: 0, slewUp: 0, slewDown: 0 },
    })
  })
})

describe('closeUp', () => {
  it('shows eight periods, the 90 % instant in the middle', () => {
    const { view } = closeUp({ ...none, frequency: 1000, timeTo90: 40e-3 }, 60e-3)!
    expect(view).toEqual([expect.closeTo(36e-3, 9), expect.closeTo(44e-3, 9)])
  })

  it('shows the last eight of what has not settled, by the small-signal frequency', () => {
    const { title, view } = closeUp({ ...none, linearFrequency: 1000 }, 60e-3)!
    expect(title).toBe('The last eight cycles')
    expect(view).toEqual([expect.closeTo(52e-3, 9), expect.closeTo(60e-3, 9)])
  })

  it('shows the first eight of what dies out', () => {
    const { title, view } = closeUp({ ...none, linearFrequency: 1000, growthRate: -600 }, 60e-3)!
    expect(title).toBe('The first eight cycles')
    expect(view).toEqual([0, expect.closeTo(8e-3, 9)])
  })

  it('shows all of a record shorter than that, and nothing without a frequency', () => {
    expect(closeUp({ ...none, linearFrequency: 1000 }, 3e-3)!.view).toEqual([0, 3e-3])
    expect(closeUp({ ...none, linearFrequency: 0 }, 3e-3)).toBeNull()
    expect(closeUp(null, 3e-3)).toBeNull()
  })
})
