/**
 * Measures the settled tone by going on from the record's end: to the next rising zero of `v1`, over whole periods to
 * find their length, and over the same periods again on an even grid. So the figures do not depend on the record's own
 * sample interval.
 */
import { deviceIndex, v1Index, v2Index, voIndex, type Plant } from '#sim/circuit/plant.ts'
import type { Machine, Position } from '#sim/modes/machine.ts'
import { Columns } from '#sim/record/columns.ts'
import { Cycles } from '#sim/record/cycles.ts'
import { Spans } from '#sim/record/spans.ts'
import { analysePair, totalHarmonicDistortion } from '#sim/spectrum/harmonics.ts'
import type { Mode, SettledTone } from '#sim/types.ts'

/** Harmonics in every THD. */
const harmonicCount = 20
/** Samples of the analysis grid over all periods measured, a power of two. */
const gridSamples = 4096
/** Samples of one period in `SettledTone.waveform`. */
const waveformSamples = 1024
/** How much longer than expected a cycle may take before the search for its end is given up. */
const patience = 3

/** Figures of the settled periods, each as `shared/figures.ts` defines it. */
export interface SettledMeasurement {
  tone: SettledTone
  /** Output, V from the reference. */
  high: number
  low: number
  mean: number
  rms: number
  /** Ratios of THD_F, at the output and at the network node. */
  thd: number
  thdAtInput: number
  /** Shares of the time under each limit, 0…1. */
  shares: Record<Exclude<Mode, 'linear'>, number>
  /** A. */
  peakOutputCurrent: number
}

/**
 * @param from where the motion stands, which is left alone
 * @param cuts rising zeros of `v1` per period
 * @param expected about how long such a cycle takes, s
 * @returns null when the motion ends or stops repeating on the way
 */
export function measureSettled(
  machine: Machine,
  from: Position,
  cuts: number,
  expected: number,
): SettledMeasurement | null {
  const { plant } = machine.settings
  const position: Position = { ...from, y: [...from.y] }
  const toZero = new Cycles(plant, () => true)
  if (machine.run(position, position.t + patience * expected, [toZero]) !== 'stopped') return null

  position.y[v1Index] = 0
  const start: Position = { ...position, y: [...position.y] }
  let crossings = 0
  const oneTurn = new Cycles(plant, () => ++crossings === cuts, start.t)
  const spans = new Spans()
  if (machine.run(position, start.t + patience * cuts * expected, [oneTurn, spans]) !== 'stopped') return null
  spans.close()
  const period = position.t - start.t

  const columns = new Columns(gridSamples, start.t, period / gridSamples, plant.dimension === 4)
  let current = 0
  const corners = {
    enter: ({ y }: Readonly<Position>) =>
      void (current = Math.max(current, Math.abs(plant.outputCurrent(y)))),
    advance: () => {},
  }
  const grid: Position = { ...start, y: [...start.y] }
  if (machine.run(grid, start.t + period, [columns, corners]) !== 'reachedEnd') return null

  const [output, input] = analysePair(columns.vo, columns.v1, harmonicCount)
  const share = (mode: Mode) => spans.share(mode, start.t, position.t)
  return {
    tone: {
      frequency: 1 / period,
      periods: 1,
      harmonics: output.harmonics,
      harmonicsAtInput: input.harmonics,
      waveform: { vo: thinned(columns.vo), v1: thinned(columns.v1) },
    },
    high: oneTurn.list.reduce((most, { high }) => Math.max(most, high), greatest(columns.vo)),
    low: oneTurn.list.reduce((lowest, { low }) => Math.min(lowest, low), least(columns.vo)),
    mean: output.mean,
    rms: output.rms,
    thd: totalHarmonicDistortion(output.harmonics),
    thdAtInput: totalHarmonicDistortion(input.harmonics),
    shares: {
      heldHigh: share('heldHigh'),
      heldLow: share('heldLow'),
      slewUp: share('slewUp'),
      slewDown: share('slewDown'),
    },
    peakOutputCurrent: Math.max(current, peakCurrent(plant, columns)),
  }
}

function greatest(samples: Float64Array): number {
  return samples.reduce((most, value) => Math.max(most, value), -Infinity)
}

function least(samples: Float64Array): number {
  return samples.reduce((lowest, value) => Math.min(lowest, value), Infinity)
}

/** Evenly chosen samples, `waveformSamples` in all. */
function thinned(samples: Float64Array): Float64Array {
  const every = samples.length / waveformSamples
  return Float64Array.from({ length: waveformSamples }, (_, n) => samples[n * every]!)
}

/** Greatest |output current| over the samples, A. */
function peakCurrent(plant: Plant, { vo, v1, v2, device }: Columns): number {
  const y = [0, 0, 0, 0]
  let peak = 0
  for (let n = 0; n < vo.length; n++) {
    y[voIndex] = vo[n]!
    y[v1Index] = v1[n]!
    y[v2Index] = v2[n]!
    if (device) y[deviceIndex] = device[n]!
    peak = Math.max(peak, Math.abs(plant.outputCurrent(y)))
  }
  return peak
}
