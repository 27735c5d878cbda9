/** The words of the engine's public face. Results are structured-cloneable; SI units throughout. */
import type { Figures } from '#shared/figures.ts'
import type { RunModeSpan } from '#shared/schemas/run.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'

export type { Circuit } from '#shared/schemas/circuit.ts'
export type { Ramp, Stimulus } from '#shared/schemas/stimulus.ts'

/** What governs the output at an instant: the loop, the slew limit, or a rail. */
export type Mode = RunModeSpan['mode']

export interface Complex {
  re: number
  im: number
}

/** A stretch of time in one mode, seconds from power-on: stored with a run as it is. */
export type ModeSpan = RunModeSpan

export interface SmallSignal {
  /** 1 + Rf/Rg at zero signal, device cold. */
  gain: number
  /** Gain at which `growthRate` is zero in the full model. */
  criticalGain: number
  /** 1 + Rs/Rp + Cp/Cs. */
  idealCriticalGain: number
  /** gain/criticalGain − 1. */
  gainMargin: number
  /** Largest real part over all poles, 1/s. */
  growthRate: number
  /** |Im| of that pole / 2π, Hz; 0 if it is real. */
  frequency: number
  /** Poles of the linear loop, 1/s. */
  poles: Complex[]
  starts: boolean
}

/** Work that a computation took. */
export interface Cost {
  method: 'odex'
  steps: number
  evaluations: number
  /** Located mode changes. */
  events: number
}

/** The tone that a record settles to, harmonics from whole settled periods. */
export interface SettledTone {
  /** Hz. */
  frequency: number
  /** Settled periods that were measured. */
  periods: number
  /** k = 1…20 of the output, peak volts; phase with t = 0 at the rising zero of `v1`. */
  harmonics: Complex[]
  /** The same at the network node `v1`. */
  harmonicsAtInput: Complex[]
  /** One settled period of output and network node, V, `waveformSamples` equal steps from the rising zero of `v1`. */
  waveform: { vo: Float64Array; v1: Float64Array }
}

/** A computation that did not end well. `path` is the input at fault where there is one. */
export interface Failure {
  kind: 'invalid' | 'stopped' | 'solver'
  path: (string | number)[]
  sentence: string
}

/** Successive maxima of |vo| from power-on: the envelope. s and V. */
export interface Envelope {
  time: Float64Array
  value: Float64Array
}

export interface SimulateOptions {
  stimulus: Stimulus
  /** s. */
  duration: number
  /** s. */
  sampleInterval: number
  /** `auto` takes the best method for the circuit. */
  method?: 'auto' | 'odex'
  /** Called now and then with the share done, 0…1. */
  onProgress?: (done: number) => void
  /** Asked now and then; true ends the computation with status `stopped`. */
  shouldStop?: () => boolean
}

export interface Simulation {
  status: 'complete' | 'stopped' | 'failed'
  /** Why it did not complete. */
  reason?: Failure
  sampleInterval: number
  /** Columns of round(duration/sampleInterval) + 1 samples, V; only the valid ones when stopped or failed. */
  vo: Float64Array
  v1: Float64Array
  v2: Float64Array
  /** The device's own state where there is one: a filament's temperature. */
  control?: { name: string; unit: string; values: Float64Array }
  modes: ModeSpan[]
  envelope: Envelope
  /** Null unless complete. */
  figures: Figures | null
  /** Null unless complete and settled. */
  tone: SettledTone | null
  /** Why the settled figures are missing, a sentence; null when they are there. */
  unsettled: string | null
  cost: Cost
}
