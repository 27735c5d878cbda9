/** Says in words what stops the growth, or why there is none. */
import { formatNumber, formatPercent, formatQuantity } from '#shared/units/format.ts'
import type { AmplitudeControl } from '#shared/schemas/circuit.ts'
import { countedShare, type Figures } from '#shared/figures.ts'
import type { Simulation, SmallSignal } from '#sim/types.ts'

export interface GrowthStory {
  headline: string
  sentences: string[]
}

export interface GrowthFacts {
  control: AmplitudeControl['kind']
  smallSignal: SmallSignal
  simulation: Pick<Simulation, 'figures' | 'unsettled'>
}

const share = (ratio: number) => formatPercent(ratio, { digits: 3 })
const volts = (value: number) => formatQuantity(value, 'V', { digits: 3 })

/** Shares of the settled period; what does not exist or acts for less than the share that counts is none. */
function shares(control: AmplitudeControl['kind'], { heldHigh, heldLow, slewUp, slewDown }: Figures) {
  const noticed = (ratio: number) => (ratio > countedShare(control) ? ratio : 0)
  return {
    high: noticed(heldHigh ?? 0),
    low: noticed(heldLow ?? 0),
    slew: noticed((slewUp ?? 0) + (slewDown ?? 0)),
  }
}

function railSentence({ high, low }: { high: number; low: number }): string {
  if (high === 0)
    return `In every settled period the output is held at the lower rail for ${share(low)} of the time; it never reaches the upper one.`
  if (low === 0)
    return `In every settled period the output is held at the upper rail for ${share(high)} of the time; it never reaches the lower one.`
  return `In every settled period the output is held at the upper rail for ${share(high)} of the time and at the lower rail for ${share(low)}.`
}

const slewSentence = (slew: number) => `For ${share(slew)} of the time it moves at the amplifier’s slew rate.`

/** What holds the level besides the amplifier's own limits. */
const devices: Record<
  Exclude<AmplitudeControl['kind'], 'none'>,
  { stops: string; slows: string; how: string }
> = {
  diodes: {
    stops: 'The diodes stop the growth',
    slows: 'The diodes slow the growth, the rails stop it',
    how: 'As the output grows the diodes conduct and bypass part of feedback R, until the gain over a period is down to the critical gain.',
  },
  lamp: {
    stops: 'The lamp stops the growth',
    slows: 'The lamp slows the growth, the rails stop it',
    how: 'As the output grows the filament warms and its resistance rises, until the gain is down to the critical gain.',
  },
}

const clear = 'It stays clear of the rails.'

function settledStory(control: AmplitudeControl['kind'], figures: Figures): GrowthStory {
  const { high, low, slew } = shares(control, figures)
  const held = high + low > 0
  const level = figures.level === null ? [] : [`The output settles at ${volts(figures.level)} peak.`]
  const limits = [
    ...(held ? [railSentence({ high, low })] : [clear]),
    ...(slew > 0 ? [slewSentence(slew)] : []),
  ]
  if (control !== 'none') {
    const { stops, slows, how } = devices[control]
    return { headline: held ? slows : stops, sentences: [how, ...level, ...limits] }
  }
  if (held) return { headline: 'The rails stop the growth', sentences: [...level, ...limits] }
  if (slew > 0) return { headline: 'The slew rate stops the growth', sentences: [...level, ...limits] }
  return { headline: 'No limit was met', sentences: [...level, ...limits, 'It does not slew either.'] }
}

export function growthStory({ control, smallSignal, simulation }: GrowthFacts): GrowthStory {
  const { figures, unsettled } = simulation
  if (figures && figures.level !== null) return settledStory(control, figures)
  const { gain, criticalGain, gainMargin, growthRate, starts } = smallSignal
  if (!starts)
    return {
      headline: 'There is no growth to stop',
      sentences: [
        `The closed-loop gain of ${formatNumber(gain)} lies ${share(-gainMargin)} below the critical gain of ${formatNumber(criticalGain)}.`,
        ...(growthRate < 0
          ? [
              `What power-on sets going dies out, to 37 % in every ${formatQuantity(-1 / growthRate, 's', { digits: 3 })}.`,
            ]
          : []),
        'Raise feedback R or lower ground R.',
      ],
    }
  return { headline: 'The growth goes on to the end of this record', sentences: unsettled ? [unsettled] : [] }
}
