/** The time-domain simulation: power-on to the end of the record, and the figures of what it settles to. */
import type { Circuit } from '#shared/schemas/circuit.ts'
import { limits } from '#shared/limits.ts'
import { fastestRate } from '#sim/circuit/fastest-rate.ts'
import { naturalPeriod } from '#sim/circuit/loop-polynomial.ts'
import { Plant } from '#sim/circuit/plant.ts'
import { outputReach, railPieces } from '#sim/circuit/rails.ts'
import { invalid, solverFailure, stoppedFailure, tooStiff } from '#sim/failures.ts'
import { figuresOf } from '#sim/figures.ts'
import { Machine, type Observer, type Position } from '#sim/modes/machine.ts'
import { stableReach, WorkMeter } from '#sim/ode/integrate.ts'
import { Columns } from '#sim/record/columns.ts'
import { Cycles, type Cycle } from '#sim/record/cycles.ts'
import { Spans } from '#sim/record/spans.ts'
import { measureSettled, type SettledMeasurement } from '#sim/settled/measure.ts'
import { cutsPerPeriod } from '#sim/settled/steadiness.ts'
import { swings, whyUnsettled } from '#sim/settled/unsettled.ts'
import { smallSignal } from '#sim/small-signal.ts'
import { startLevel } from '#sim/start-level.ts'
import type { Failure, SimulateOptions, Simulation, SmallSignal } from '#sim/types.ts'
import { mostEvaluations, predictedEvaluations } from '#sim/work.ts'

/** Error per step relative to the amplitude, and the same while a stiff amplifier keeps the steps short anyway. */
const tolerance = 1e-10
const stiffTolerance = 1e-7
/** Fewest integration steps in a period 2π/ω0: the longest step is this share of it. */
const stepsPerPeriod = 8
/** First step after a mode change, in time constants of the fastest pole. */
const firstStepShare = 0.5
/** Time constants of the fastest pole in a period beyond which stability limits the steps more than accuracy. */
const stiffness = 500
/** Advances between two looks at the caller's wishes. */
const advancesPerLook = 128

/** Reports progress and asks whether to stop. */
class Hooks implements Observer {
  private count = 0
  constructor(
    private readonly duration: number,
    private readonly options: SimulateOptions,
  ) {}
  advance(_stretch: unknown, _a: number, b: number): number | void {
    if (++this.count % advancesPerLook !== 0) return
    this.options.onProgress?.(b / this.duration)
    if (this.options.shouldStop?.()) return b
  }
}

/** Whether nothing limited the output: without amplitude control such a level is still on its way. */
function isLinear({ shares }: SettledMeasurement): boolean {
  return Object.values(shares).every((share) => share === 0)
}

/** What the motion settles to, measured from the record's end; null while it has not settled. */
function settledOf(
  circuit: Circuit,
  machine: Machine,
  end: Position,
  cycles: readonly Cycle[],
): SettledMeasurement | null {
  if (!swings(cycles, machine.settings.scale)) return null
  const cuts = cutsPerPeriod(cycles)
  if (cuts === null) return null
  const last = cycles.at(-1)!
  const settled = measureSettled(machine, end, cuts, last.end - last.start)
  return settled && circuit.amplitudeControl.kind === 'none' && isLinear(settled) ? null : settled
}

/** The first of the options that no computation can work with, or null. */
function optionFault({ duration, sampleInterval }: SimulateOptions): Failure | null {
  if (!(duration > 0 && Number.isFinite(duration)))
    return invalid(['timing', 'duration'], 'Duration must be a finite number greater than zero.')
  if (!(sampleInterval > 0 && Number.isFinite(sampleInterval)))
    return invalid(['timing', 'sampleInterval'], 'Sample interval must be a finite number greater than zero.')
  if (Math.round(duration / sampleInterval) + 1 > limits.samples)
    return invalid(['timing', 'sampleInterval'], 'The record has more samples than the engine takes.')
  return null
}

/** What a simulation that never began gives back. */
function emptySimulation(options: SimulateOptions, reason: Failure): Simulation {
  const none = () => new Float64Array(0)
  return {
    status: 'failed',
    reason,
    sampleInterval: options.sampleInterval,
    vo: none(),
    v1: none(),
    v2: none(),
    modes: [],
    envelope: { time: none(), value: none() },
    figures: null,
    tone: null,
    unsettled: null,
    cost: { method: 'odex', steps: 0, evaluations: 0, events: 0 },
  }
}

/** The mode machine with its tolerances and step lengths for this circuit and stimulus. */
function machineFor(circuit: Circuit, options: SimulateOptions, linear: SmallSignal): Machine {
  const plant = new Plant(circuit)
  const reach = outputReach(circuit)
  const scale = Math.max(reach.high, reach.low)
  const period = naturalPeriod(circuit.network)
  const fastest = Math.max(fastestRate(circuit, linear), 1 / period)
  const volts = Math.min(scale, startLevel(circuit, options.stimulus, linear.gain))
  return new Machine({
    plant,
    pieces: railPieces(circuit, options.stimulus),
    tolerance,
    stiffTolerance,
    smallest: plant.dimension === 4 ? [volts, volts, volts, 1] : [volts, volts, volts],
    scale,
    shortTime: firstStepShare / fastest,
    longestStep: period / stepsPerPeriod,
    longestLinearStep: fastest * period > stiffness ? stableReach / fastest : period / stepsPerPeriod,
    period,
    stiff: fastest * period > stiffness,
    work: new WorkMeter(mostEvaluations),
  })
}

/**
 * Simulates from power-on. `circuit` has passed `circuitSchema`. Never throws for its inputs: what cannot be computed
 * comes back as status `failed` with a sentence.
 */
export function simulate(circuit: Circuit, options: SimulateOptions): Simulation {
  const fault = optionFault(options)
  if (fault) return emptySimulation(options, fault)
  const linear = smallSignal(circuit)
  const samples = Math.round(options.duration / options.sampleInterval) + 1
  const duration = (samples - 1) * options.sampleInterval
  const predicted = predictedEvaluations(circuit, linear, duration)
  if (predicted > mostEvaluations)
    return emptySimulation(options, tooStiff(predicted, mostEvaluations, duration))

  const machine = machineFor(circuit, options, linear)
  const { plant, work } = machine.settings
  const columns = new Columns(samples, 0, options.sampleInterval, plant.path.state !== null)
  const cycles = new Cycles(plant)
  const spans = new Spans()
  const kick = options.stimulus.kind === 'kick' ? options.stimulus.voltage : 0
  const position = machine.start(plant.initialState(kick))
  const outcome = machine.run(position, duration, [columns, cycles, spans, new Hooks(duration, options)])
  spans.close()

  const complete = outcome === 'reachedEnd'
  const settled = complete && linear.starts ? settledOf(circuit, machine, position, cycles.list) : null
  const ending = {
    circuit,
    stimulus: options.stimulus,
    linear,
    cycles: cycles.list,
    modes: spans.list,
    plant,
    end: position,
  }
  options.onProgress?.(1)
  return {
    status: complete ? 'complete' : outcome === 'stopped' ? 'stopped' : 'failed',
    ...(complete
      ? {}
      : { reason: outcome === 'stopped' ? stoppedFailure : solverFailure(outcome, position.t) }),
    sampleInterval: options.sampleInterval,
    vo: columns.vo.subarray(0, columns.filled),
    v1: columns.v1.subarray(0, columns.filled),
    v2: columns.v2.subarray(0, columns.filled),
    ...(plant.path.state && columns.device
      ? {
          control: {
            name: plant.path.state.name,
            unit: plant.path.state.unit,
            values: columns.device.subarray(0, columns.filled),
          },
        }
      : {}),
    modes: spans.list,
    envelope: { time: Float64Array.from(cycles.peakTimes), value: Float64Array.from(cycles.peakValues) },
    figures: complete ? figuresOf(linear, cycles, settled) : null,
    tone: settled?.tone ?? null,
    unsettled: !complete || settled ? null : whyUnsettled(ending),
    cost: { method: 'odex', steps: work.steps, evaluations: work.evaluations, events: machine.events },
  }
}
