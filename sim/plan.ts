/**
 * Turns a person's wish for a record into a grid. What is left open (null) is chosen to show the start-up and some
 * settled periods, or the decay, with some hundreds of samples a period.
 */
import { limits } from '#shared/limits.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { Timing } from '#shared/schemas/simulation.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'
import { formatCount, formatQuantity } from '#shared/units/format.ts'
import { naturalPeriod } from '#sim/circuit/loop-polynomial.ts'
import { outputReach, railsUp } from '#sim/circuit/rails.ts'
import { invalid } from '#sim/failures.ts'
import { settlingTime } from '#sim/settling-time.ts'
import { smallSignal } from '#sim/small-signal.ts'
import { startLevel } from '#sim/start-level.ts'
import type { Failure, SmallSignal } from '#sim/types.ts'
import { affordableDuration, allowedDuration } from '#sim/work.ts'

export interface Plan {
  /** s. */
  duration: number
  /** s. */
  sampleInterval: number
  /** Samples per column: round(duration/sampleInterval) + 1. */
  samples: number
}

/** Settled periods shown after the start-up, and their least share of it. */
const settledPeriods = 24
const settledShare = 0.15
/** Shortest automatic record, periods. */
const leastPeriods = 30
/** Fewest periods worth showing where the work allowed does not reach further. */
const fewestPeriods = 8
/** A decay is shown over this many of its time constants. */
const decaysShown = 5
/** Samples per period are at least this many when chosen here, unless the record would grow too long to be stored. */
const samplesPerPeriod = 200
const durationSteps = [1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10]
const intervalSteps = [1, 2, 5, 10]

/** The least of `steps`·10ⁿ that is not below `value`. */
function roundedUp(value: number, steps: readonly number[]): number {
  const exponent = Math.floor(Math.log10(value))
  const mantissa = value / 10 ** exponent
  const step = steps.find((candidate) => candidate >= mantissa * (1 - 1e-9)) ?? 10
  return decimal(step, exponent)
}

/** The greatest of `steps`·10ⁿ that is not above `value`. */
function roundedDown(value: number, steps: readonly number[]): number {
  const exponent = Math.floor(Math.log10(value))
  const mantissa = value / 10 ** exponent
  const step = steps.findLast((candidate) => candidate <= mantissa * (1 + 1e-9)) ?? 1
  return decimal(step, exponent)
}

/** step·10^exponent, the double nearest to its decimal writing. */
function decimal(step: number, exponent: number): number {
  return Number(`${step}e${exponent}`)
}

/** Period that the loop oscillates with, about; the network's own where the loop does not ring. s. */
function expectedPeriod(circuit: Circuit, linear: SmallSignal): number {
  const own = naturalPeriod(circuit.network)
  return linear.frequency > 0 ? Math.max(own, 1 / linear.frequency) : own
}

/** Time that shows the start-up and the settled tone, or the decay, s. */
function showingTime(circuit: Circuit, stimulus: Stimulus, linear: SmallSignal): number {
  const period = expectedPeriod(circuit, linear)
  const shortest = leastPeriods * period
  const after = railsUp(stimulus)
  if (!linear.starts)
    return after + Math.max(shortest, decaysShown / Math.max(-linear.growthRate, Number.MIN_VALUE))
  const { high, low } = outputReach(circuit)
  const growth =
    Math.log(Math.max(1, Math.min(high, low) / startLevel(circuit, stimulus, linear.gain))) /
    linear.growthRate
  const settling = growth + settlingTime(circuit, linear)
  return after + Math.max(shortest, settling + Math.max(settledPeriods * period, settledShare * settling))
}

/** The duration that a person who states none gets, s: as showing and as affordable as can be. */
function automaticDuration(circuit: Circuit, stimulus: Stimulus, linear: SmallSignal): number {
  const period = expectedPeriod(circuit, linear)
  const most = Math.min(
    limits.duration[1],
    (limits.periods * period) / durationSteps[1]!,
    railsUp(stimulus) + Math.max(leastPeriods * period, affordableDuration(circuit, linear)),
  )
  const wished = roundedUp(
    Math.min(most, Math.max(limits.duration[0], showingTime(circuit, stimulus, linear))),
    durationSteps,
  )
  const allowed = allowedDuration(circuit, linear)
  return wished > allowed && allowed > fewestPeriods * period ? roundedDown(allowed, durationSteps) : wished
}

/** The sample interval that a person who states none gets, s; a round one that keeps the record storable. */
function automaticInterval(period: number, duration: number): number {
  const wished = roundedDown(Math.min(period / samplesPerPeriod, duration), intervalSteps)
  const coarsest = duration / (limits.storedSamples - 1)
  return Math.max(limits.sampleInterval[0], wished >= coarsest ? wished : roundedUp(coarsest, intervalSteps))
}

/**
 * The grid for a circuit and stimulus.
 * @param timing seconds, null where the engine is to choose
 * @returns the grid, or a failure of kind `invalid` at the field of `timing` that can mend it
 */
export function plan(circuit: Circuit, timing: Timing, stimulus: Stimulus): Plan | Failure {
  const linear = smallSignal(circuit)
  const period = expectedPeriod(circuit, linear)
  const duration = timing.duration ?? automaticDuration(circuit, stimulus, linear)
  const periods = duration / period
  if (periods > limits.periods)
    return invalid(
      ['timing', 'duration'],
      `The duration covers ${formatCount(periods)} periods of ${formatQuantity(period, 's')}; at most ${formatCount(limits.periods)} are computed.`,
    )
  const sampleInterval = timing.sampleInterval ?? automaticInterval(period, duration)
  if (sampleInterval > duration)
    return invalid(
      ['timing', timing.duration === null ? 'sampleInterval' : 'duration'],
      `Duration ${formatQuantity(duration, 's')} is shorter than one sample interval of ${formatQuantity(sampleInterval, 's')}.`,
    )
  const samples = Math.round(duration / sampleInterval) + 1
  if (samples > limits.samples)
    return invalid(
      ['timing', timing.sampleInterval === null ? 'duration' : 'sampleInterval'],
      `The record would have ${formatCount(samples)} samples; at most ${formatCount(limits.samples)} are kept. Lengthen the sample interval or shorten the duration.`,
    )
  return { duration, sampleInterval, samples }
}
