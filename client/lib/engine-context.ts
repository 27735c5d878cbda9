import { createContext, useContext } from 'react'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import type { Circuit, Failure, Simulation, SmallSignal } from '#sim/types.ts'

/** The grid that a record was computed on; times in seconds. */
export interface RecordGrid {
  duration: number
  sampleInterval: number
  samples: number
}

/** A record with its grid. The engine may have ended it early; then its own `status` says so. */
export interface RecordResult {
  simulation: Simulation
  grid: RecordGrid
  /** `engineVersion` of `sim/index.ts`, as it stands in the worker that computed the record. */
  engineVersion: string
}

export interface RunOptions {
  /** Aborting rejects the promise with an `AbortError` and stops the computation. */
  signal?: AbortSignal
  /** Called now and then with the share done, 0…1. */
  onProgress?: (done: number) => void
}

/**
 * The engine as pages see it; it computes in workers (`client/workers/`). What the engine refuses or fails at is data,
 * a `Failure`. Promises reject only with an `AbortError`, or with an `Error` whose message tells the user what
 * happened when a worker died.
 */
export interface EngineClient {
  /** Poles and gains of the linear loop: a fraction of a millisecond, never held up by a record under way. */
  smallSignal(circuit: Circuit): Promise<SmallSignal | Failure>
  /** One record at a time: a newer request makes the one under way obsolete (`AbortError`). */
  run(inputs: RunInputs, options?: RunOptions): Promise<RecordResult | Failure>
}

/** Tells a failure from an answer. */
export function isFailure(answer: SmallSignal | RecordResult | Failure): answer is Failure {
  return 'sentence' in answer
}

/** Tells whether a promise ended because its request was given up. */
export function isAbort(error: unknown): boolean {
  return error instanceof DOMException && error.name === 'AbortError'
}

export const EngineContext = createContext<EngineClient | null>(null)

/** The engine of this page. Throws outside its provider. */
export function useEngine(): EngineClient {
  const engine = useContext(EngineContext)
  if (!engine) throw new Error('useEngine needs an EngineContext above it')
  return engine
}
