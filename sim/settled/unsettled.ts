/** Why a record has no settled figures, in a sentence. */
import { formatNumber, formatQuantity } from '#shared/units/format.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { v1Index, type Plant } from '#sim/circuit/plant.ts'
import { railsUp } from '#sim/circuit/rails.ts'
import type { Position } from '#sim/modes/machine.ts'
import type { Cycle } from '#sim/record/cycles.ts'
import type { ModeSpan, SmallSignal } from '#sim/types.ts'

/** Share of the record, at its end, that must be held at one rail before the output counts as resting. */
const restShare = 0.25
/** Swing against the rails, relative, below which the output is at rest. */
const restSwing = 1e-6

interface Ending {
  circuit: Circuit
  stimulus: Stimulus
  linear: SmallSignal
  cycles: readonly Cycle[]
  modes: readonly ModeSpan[]
  plant: Plant
  /** Where the motion stands at the record's end. */
  end: Readonly<Position>
}

/** Whether anything sets the loop going. */
function disturbed({ circuit, stimulus }: Ending): boolean {
  return circuit.amplifier.offset !== 0 || (stimulus.kind === 'kick' && stimulus.voltage !== 0)
}

/**
 * Whether the output, long held at a rail, is held there for good: with the network discharged, so that only the
 * amplifier's offset is left at its input, its demand still points beyond the rail.
 */
function restsAtRail({ modes, plant, end }: Ending): boolean {
  const last = modes.at(-1)
  if (!last || last.end - last.start <= restShare * end.t) return false
  const discharged = end.y.map((value, index) => (index === v1Index ? 0 : value))
  const demand = plant.demand(discharged)
  return last.mode === 'heldHigh' ? demand > 0 : last.mode === 'heldLow' && demand < 0
}

/** The reason, most fundamental first, and what to do where something helps. */
export function whyUnsettled(ending: Ending): string {
  const { linear, cycles, stimulus, end } = ending
  if (!disturbed(ending)) return 'Nothing sets it going: without an offset or a kick the loop stays at rest.'
  if (!linear.starts) {
    const gain = formatNumber(linear.gain, { digits: 6 })
    if (!Number.isFinite(linear.criticalGain))
      return 'It dies out: with this amplifier no closed-loop gain sustains the loop.'
    return `It dies out: a closed-loop gain of ${gain} is not above the critical gain of ${formatNumber(linear.criticalGain, { digits: 6 })}.`
  }
  const up = railsUp(stimulus)
  if (end.t < up)
    return `The record of ${formatQuantity(end.t, 's')} ends before the supplies are up at ${formatQuantity(up, 's')}: lengthen the duration.`
  if (restsAtRail(ending))
    return `It does not oscillate: the output rests at the ${end.mode === 'heldHigh' ? 'upper' : 'lower'} rail.`
  if (cycles.length < 2)
    return `The record of ${formatQuantity(end.t, 's')} ends within the first cycles: lengthen the duration.`
  return 'The record ends before the level has settled: lengthen the duration.'
}

/** Whether the cycles at the end still swing at all, against rails of `scale` volts. */
export function swings(cycles: readonly Cycle[], scale: number): boolean {
  const last = cycles.at(-1)
  return last !== undefined && last.high - last.low > restSwing * scale
}
