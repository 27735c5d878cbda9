/** What deserves a second look without being wrong: the design is computed all the same. */
import type { Figures } from '#shared/figures.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { formatNumber, formatPercent, formatQuantity } from '#shared/units/format.ts'
import type { SmallSignal } from '#sim/types.ts'

export interface Caution {
  key: string
  sentence: string
}

/** Loop gain left at the oscillation, GBW/(gain·f), below which frequency and gain suffer noticeably. */
const leastLoopGain = 20
/** Most amplifiers of the classes that we list want at least this much from rail to rail, V. Common practice, no source. */
const lowSupply = 2.7
/** Ripple-free direct voltage above which IEC 61140 no longer counts it as extra-low, V. From memory. */
const touchVoltage = 60
/** Margins within the tolerance of ordinary 1 % parts. Common practice, no source. */
const thinMargin = 0.02

function speed(linear: SmallSignal, { amplifier }: Circuit): Caution | null {
  const loopGain = amplifier.gainBandwidth / (linear.gain * linear.frequency)
  if (linear.frequency === 0 || loopGain >= leastLoopGain) return null
  const sentence =
    loopGain < 1
      ? `The amplifier is slower than the oscillator: at ${formatQuantity(linear.frequency, 'Hz')} it cannot even give the gain of ${formatNumber(linear.gain)}.`
      : `The amplifier is slow for this tone: ${formatNumber(loopGain, { digits: 2 })} times the bandwidth needed, so it lowers the frequency and raises the critical gain. Take one that is faster.`
  return { key: 'speed', sentence }
}

function slew(figures: Figures | null, linear: SmallSignal, { amplifier, supply }: Circuit): Caution | null {
  const level = figures?.level
  if (!level || linear.frequency === 0) return null
  const needed = 2 * Math.PI * linear.frequency * level
  if (needed <= amplifier.slewRate) return null
  const clean = Math.min(amplifier.slewRate / (2 * Math.PI * linear.frequency), supply.positive)
  return {
    key: 'slew',
    sentence: `A clean sine of ${formatQuantity(level, 'V', { digits: 3 })} at this frequency needs ${formatQuantity(needed, 'V/s', { digits: 2 })}, more than the slew rate; up to ${formatQuantity(clean, 'V', { digits: 2 })} would do.`,
  }
}

function current(figures: Figures | null, { amplifier }: Circuit): Caution | null {
  const peak = figures?.peakOutputCurrent
  const rating = amplifier.outputCurrent
  if (!peak || rating === undefined || peak <= rating) return null
  return {
    key: 'current',
    sentence: `The output is asked for ${formatQuantity(peak, 'A', { digits: 3 })} peak, over its rated ${formatQuantity(rating, 'A')}. The model does not limit the current: a real amplifier would clip or heat up. Raise the resistances.`,
  }
}

function margin(linear: SmallSignal): Caution | null {
  if (!linear.starts || linear.gainMargin >= thinMargin) return null
  return {
    key: 'margin',
    sentence: `A margin of ${formatPercent(linear.gainMargin, { digits: 2 })} is less than 1 % parts may take away: not every unit built will start unless each is trimmed.`,
  }
}

function supplies({ supply, amplitudeControl }: Circuit): Caution[] {
  const total = supply.positive + supply.negative
  return [
    ...(total < lowSupply
      ? [
          {
            key: 'low-supply',
            sentence: `${formatQuantity(total, 'V')} from rail to rail is little: check that the amplifier is specified for it.`,
          },
        ]
      : []),
    ...(total > touchVoltage
      ? [
          {
            key: 'high-supply',
            sentence: `${formatQuantity(total, 'V')} from rail to rail can hurt: over 60 V direct voltage insulate, guard and discharge before touching.`,
          },
        ]
      : []),
    ...(amplitudeControl.kind === 'lamp'
      ? [
          {
            key: 'filament',
            sentence: 'Filaments run hot: keep fingers and plastic away, and let them cool before work.',
          },
        ]
      : []),
  ]
}

/** @param figures of the present values; null while they are being computed */
export function cautions(linear: SmallSignal | null, circuit: Circuit, figures: Figures | null): Caution[] {
  const found = linear
    ? [speed(linear, circuit), slew(figures, linear, circuit), current(figures, circuit), margin(linear)]
    : []
  return [...found.filter((caution) => caution !== null), ...supplies(circuit)]
}
