import { describe, expect, it } from 'vitest'
import { growthStory, type GrowthFacts } from '#client/features/start-up/lib/growth-story.ts'
import { figureKeys, type Figures } from '#shared/figures.ts'

const none = Object.fromEntries(figureKeys.map((key) => [key, null])) as Figures
const settled = { ...none, level: 7.5, heldHigh: 0, heldLow: 0, slewUp: 0, slewDown: 0 }

const smallSignal = {
  gain: 3.05,
  criticalGain: 3,
  idealCriticalGain: 3,
  gainMargin: 0.05 / 3,
  growthRate: 155,
  frequency: 990,
  poles: [],
  starts: true,
}

function story(figures: Partial<Figures> | null, more: Partial<GrowthFacts> = {}) {
  const simulation = { figures: figures && { ...settled, ...figures }, unsettled: null }
  const { headline, sentences } = growthStory({ control: 'none', smallSignal, simulation, ...more })
  return { headline, text: sentences.join(' ').replaceAll('\u2009', ' ') }
}

describe('growthStory', () => {
  it('names the rails and for how long each holds the output', () => {
    const { headline, text } = story({ heldHigh: 0.111, heldLow: 0.08 })
    expect(headline).toBe('The rails stop the growth')
    expect(text).toContain('settles at 7.5 V peak')
    expect(text).toContain('upper rail for 11.1 % of the time and at the lower rail for 8 %')
  })

  it('says so when only one rail is reached', () => {
    expect(story({ heldLow: 0.1 }).text).toContain('never reaches the upper one')
    expect(story({ heldHigh: 0.1 }).text).toContain('never reaches the lower one')
  })

  it('does not speak of a limit that acts for a share nobody would notice', () => {
    const { headline, text } = story({ heldHigh: 5e-5 }, { control: 'diodes' })
    expect(headline).toBe('The diodes stop the growth')
    expect(text).toContain('It stays clear of the rails.')
    expect(story({ heldHigh: 5e-5 }).headline).toBe('The rails stop the growth')
  })

  it('names the slew rate, alone or beside the rails', () => {
    const alone = story({ slewUp: 0.3, slewDown: 0.31 })
    expect(alone.headline).toBe('The slew rate stops the growth')
    expect(alone.text).toContain('For 61 % of the time')
    expect(story({ heldHigh: 0.1, heldLow: 0.1, slewUp: 0.2, slewDown: 0.2 }).text).toContain(
      'For 40 % of the time',
    )
  })

  it('names the amplitude control while the rails are not reached, and both when they are', () => {
    expect(story({}, { control: 'lamp' }).headline).toBe('The lamp stops the growth')
    expect(story({}, { control: 'diodes' }).headline).toBe('The diodes stop the growth')
    expect(story({ heldHigh: 0.1 }, { control: 'diodes' }).headline).toBe(
      'The diodes slow the growth, the rails stop it',
    )
  })

  it('says how far the gain lies below the critical gain when it dies out', () => {
    const low = { ...smallSignal, gain: 2.95, gainMargin: -0.05 / 3, growthRate: -155, starts: false }
    const { headline, text } = story({ level: null }, { smallSignal: low })
    expect(headline).toBe('There is no growth to stop')
    expect(text).toContain('gain of 2.95 lies 1.67 % below the critical gain of 3')
    expect(text).toContain('to 37 % in every 6.45 ms')
  })

  it('passes on why nothing has settled', () => {
    const simulation = { figures: none, unsettled: 'The output still grows at the end of the record.' }
    const { headline, text } = story(null, { simulation })
    expect(headline).toBe('The growth goes on to the end of this record')
    expect(text).toBe('The output still grows at the end of the record.')
  })
})
