/** Why a record has no settled figures, in a sentence. */
import { formatNumber, formatQuantity } from '#shared/units/format.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { Cycle } from '#sim/record/cycles.ts'
import type { ModeSpan, SmallSignal } from '#sim/types.ts'

/** Share of the record, at its end, that must be free of cycles before the output counts as resting. */
const restShare = 0.25
/** Swing against the rails, relative, below which the output is at rest. */
const restSwing = 1e-6

interface Ending {
  circuit: Circuit
  stimulus: Stimulus
  linear: SmallSignal
  cycles: readonly Cycle[]
  modes: readonly ModeSpan[]
  duration: number
}

/** Whether anything sets the loop going. */
function disturbed({ circuit, stimulus }: Ending): boolean {
  return circuit.amplifier.offset !== 0 || (stimulus.kind === 'kick' && stimulus.voltage !== 0)
}

export function whyUnsettled(ending: Ending): string {
  const { linear, cycles, modes, duration } = ending
  if (!disturbed(ending)) return 'Nothing sets it going: without an offset or a kick the loop stays at rest.'
  if (!linear.starts) {
    const gain = formatNumber(linear.gain, { digits: 6 })
    if (!Number.isFinite(linear.criticalGain))
      return 'It dies out: with this amplifier no closed-loop gain sustains the loop.'
    return `It dies out: a closed-loop gain of ${gain} is not above the critical gain of ${formatNumber(linear.criticalGain, { digits: 6 })}.`
  }
  const last = modes.at(-1)
  if (last && last.end - last.start > restShare * duration && last.mode !== 'linear')
    return `It does not oscillate: the output rests at the ${last.mode === 'heldHigh' ? 'upper' : 'lower'} rail.`
  if (cycles.length < 2)
    return `The record of ${formatQuantity(duration, 's')} ends within the first cycles: lengthen the duration.`
  return 'The record ends before the level has settled: lengthen the duration.'
}

/** Whether the cycles at the end still swing at all, against rails of `scale` volts. */
export function swings(cycles: readonly Cycle[], scale: number): boolean {
  const last = cycles.at(-1)
  return last !== undefined && last.high - last.low > restSwing * scale
}
