/** The answer in a sentence: does it start, how fast, and what stops the growth? */
import { criticalFeedback } from '#client/features/sheet/trim.ts'
import { countedShare, type Figures } from '#shared/figures.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { formatNumber, formatPercent, formatQuantity } from '#shared/units/format.ts'
import type { SmallSignal } from '#sim/types.ts'

export interface Phrase {
  text: string
  /** How it is set: the verdict itself, a figure, or what limits. */
  mark?: 'good' | 'bad' | 'strong' | 'limit'
}

/** What is known of the record: its figures, or that there is none yet. */
export interface RecordFacts {
  figures: Figures | null
  /** s. */
  duration: number
}

const percent = (ratio: number) => formatPercent(ratio, { digits: 2 })

/** The gain margin with the digits of the verdict line, so that both say one thing. */
const margin = (ratio: number) => formatPercent(Math.abs(ratio), { digits: 3 })

function holder(circuit: Circuit, figures: Figures): { who: string; how: string } | null {
  const share = (...keys: ('heldHigh' | 'heldLow' | 'slewUp' | 'slewDown')[]) =>
    keys.reduce((sum, key) => sum + (figures[key] ?? 0), 0)
  const kind = circuit.amplitudeControl.kind
  const counted = countedShare(kind)
  const held = share('heldHigh', 'heldLow') > counted
  if (kind !== 'none' && !held)
    return kind === 'lamp'
      ? { who: 'lamp', how: 'holds the level' }
      : { who: 'diodes', how: 'hold the level' }
  if (held) {
    const only = share('heldLow') <= counted ? 'upper ' : share('heldHigh') <= counted ? 'lower ' : ''
    return only ? { who: `${only}rail`, how: 'stops the growth' } : { who: 'rails', how: 'stop the growth' }
  }
  if (share('slewUp', 'slewDown') > counted) return { who: 'slew rate', how: 'stops the growth' }
  return null
}

/** Growth of the envelope in one cycle, as a ratio: 0.06 is 6 % a cycle. */
function growthPerCycle({ growthRate, frequency }: SmallSignal): number {
  return Math.expm1(growthRate / frequency)
}

/** "grows 6.4 % a cycle", or by its factor where the growth is no longer small. */
function growth(linear: SmallSignal): string {
  const ratio = growthPerCycle(linear)
  return ratio < 1
    ? `grows ${percent(ratio)} a cycle`
    : `grows ${formatNumber(1 + ratio, { digits: 2 })}-fold a cycle`
}

function whenItStarts(linear: SmallSignal, circuit: Circuit, record: RecordFacts | null): Phrase[] {
  const lead: Phrase = { text: 'It starts.', mark: 'good' }
  const excess =
    linear.gainMargin < 1
      ? ` The loop exceeds its critical gain by ${margin(linear.gainMargin)}`
      : ` The gain is ${formatNumber(1 + linear.gainMargin, { digits: 3 })} times the critical gain`
  if (linear.frequency === 0)
    return [
      { text: 'It runs to a rail.', mark: 'bad' },
      {
        text: `${excess}, so far that it does not ring: the output leaves for a rail without oscillating. Lower feedback R.`,
      },
    ]
  const grows = `${excess}, ${growth(linear)}`
  const figures = record?.figures
  if (!record || !figures) return [lead, { text: `${grows}.` }]
  if (figures.timeTo90 === null)
    return [
      lead,
      {
        text: `${grows} and has not settled within the record of ${formatQuantity(record.duration, 's', { digits: 3 })}.`,
      },
    ]
  const limit = holder(circuit, figures)
  return [
    lead,
    { text: `${grows} and reaches 90 % of its level after ` },
    { text: formatQuantity(figures.timeTo90, 's', { digits: 3 }), mark: 'strong' },
    ...(limit
      ? [{ text: '; the ' }, { text: limit.who, mark: 'limit' as const }, { text: ` ${limit.how}.` }]
      : [{ text: '.' }]),
  ]
}

function whenItDoesNot(linear: SmallSignal, circuit: Circuit): Phrase[] {
  const lead: Phrase = { text: 'It does not start.', mark: 'bad' }
  const critical = criticalFeedback(circuit, linear)
  if (critical === null)
    return [
      lead,
      { text: ' No gain sustains this loop with this amplifier: it is too slow for the network.' },
    ]
  const fade = linear.growthRate < 0 ? Math.LN2 / -linear.growthRate : null
  return [
    lead,
    { text: ` The loop is ${margin(linear.gainMargin)} short of its critical gain` },
    {
      text:
        fade === null
          ? '; '
          : `, and a disturbance halves every ${formatQuantity(fade, 's', { digits: 2 })}; `,
    },
    { text: `feedback R above ${formatQuantity(critical, 'Ω')}`, mark: 'strong' },
    { text: ' would carry it over the critical gain.' },
  ]
}

/** @param record null until the first record, or when it belongs to earlier values */
export function verdict(linear: SmallSignal, circuit: Circuit, record: RecordFacts | null): Phrase[] {
  return linear.starts ? whenItStarts(linear, circuit, record) : whenItDoesNot(linear, circuit)
}
