/** The pool of worker threads that run the engine: the only way from the server to a computation. */
import { availableParallelism } from 'node:os'
import { Piscina } from 'piscina'
import { BusyError, ComputeError, type ComputeResult } from '#server/compute/computed-run.ts'
import { findWorkerFile, type WorkerFile } from '#server/compute/worker-file.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

export { BusyError, ComputeError } from '#server/compute/computed-run.ts'
export type { ComputedRun, ComputeResult, Failure } from '#server/compute/computed-run.ts'

/** Longest stay of one computation from question to answer, waiting included, ms: nobody waits longer for a save. */
const timeLimit = 60_000
/** Computations that may wait for a thread; beyond them a question is refused at once. */
const maxQueue = 16
/** How long a stopping server waits for the computations under way, ms. */
const closeTimeout = 5_000

export interface ComputeOptions {
  threads?: number
  maxQueue?: number
  /** ms. */
  timeLimit?: number
  /** ms. */
  closeTimeout?: number
  worker?: WorkerFile
}

export interface Compute {
  /**
   * Computes a run in a worker thread. A refusal, a solver that fails and the time limit come back as data.
   * Rejects with `BusyError` when the queue is full, `ComputeError` when the thread ends early, and the signal's
   * reason when the caller aborts (the thread is then ended and replaced).
   */
  run(inputs: RunInputs, options?: { signal?: AbortSignal }): Promise<ComputeResult>
  /** Lets the computations under way finish within a few seconds, then ends the threads. */
  close(): Promise<void>
}

const overTime = (limit: number): ComputeResult => ({
  kind: 'stopped',
  path: [],
  sentence: `The computation took longer than ${limit / 1000} s and was ended. Shorten the duration.`,
})

export function createCompute(options: ComputeOptions = {}): Compute {
  const threads = options.threads ?? availableParallelism()
  const places = threads + (options.maxQueue ?? maxQueue)
  const limit = options.timeLimit ?? timeLimit
  let pool: Piscina<RunInputs, ComputeResult> | null = null
  let taken = 0
  let closed = false

  /** The pool starts with the first question: most tests and commands never ask one. */
  function start(): Piscina<RunInputs, ComputeResult> {
    const { filename, execArgv } = options.worker ?? findWorkerFile()
    const started = new Piscina<RunInputs, ComputeResult>({
      filename,
      execArgv,
      minThreads: threads,
      maxThreads: threads,
      closeTimeout: options.closeTimeout ?? closeTimeout,
    })
    // A thread that cannot even start leaves piscina without threads for good: the next question starts a new pool.
    started.on('error', (error: Error) => {
      process.emitWarning(error)
      if (pool === started) pool = null
      void started.destroy()
    })
    return started
  }

  return {
    async run(inputs, { signal } = {}) {
      signal?.throwIfAborted()
      if (closed) throw new BusyError('The server is stopping.')
      // Counted here: piscina's own maxQueue does not see tasks that carry an abort signal.
      if (taken >= places) throw new BusyError('Every computing thread is taken. Try again in a moment.')
      const stop = new AbortController()
      const onAbort = () => stop.abort()
      signal?.addEventListener('abort', onAbort, { once: true })
      const clock = setTimeout(onAbort, limit)
      taken += 1
      try {
        pool ??= start()
        return await pool.run(inputs, { signal: stop.signal })
      } catch (cause) {
        signal?.throwIfAborted()
        if (stop.signal.aborted) return overTime(limit)
        throw new ComputeError('The computing thread failed before it answered.', { cause })
      } finally {
        taken -= 1
        clearTimeout(clock)
        signal?.removeEventListener('abort', onAbort)
      }
    },
    async close() {
      closed = true
      await pool?.close()
    },
  }
}
