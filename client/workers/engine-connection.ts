/** One worker that runs the engine, as its owner `engine-client.ts` holds it. */
import { releaseProxy, wrap, type Remote } from 'comlink'
import type { RecordResult } from '#client/lib/engine-context.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import type { Circuit, Failure, SmallSignal } from '#sim/types.ts'

/** What the worker answers to. Failures are data: errors lose their fields on the way between threads. */
export interface EngineService {
  smallSignal(circuit: Circuit): SmallSignal | Failure
  run(inputs: RunInputs, onProgress?: (done: number) => void): RecordResult | Failure
}

/** A live worker. Calls on it never settle once it is terminated or dead; the owner rejects for it. */
export interface EngineConnection {
  smallSignal(circuit: Circuit): Promise<SmallSignal | Failure>
  run(inputs: RunInputs, onProgress?: (done: number) => void): Promise<RecordResult | Failure>
  terminate(): void
}

/** Starts a worker. `onDeath` is called at most once, with the browser's own words, when it breaks by itself. */
export type Connect = (onDeath: (reason: string) => void) => EngineConnection

/** The service behind a message endpoint as an `EngineConnection` without its `terminate`. */
export function callsOn(remote: Remote<EngineService>): Omit<EngineConnection, 'terminate'> {
  return {
    smallSignal: (circuit) => remote.smallSignal(circuit),
    run: (inputs, onProgress) => remote.run(inputs, onProgress as never),
  }
}

/** Starts a browser worker. */
export const connectWorker: Connect = (onDeath) => {
  const worker = new Worker(new URL('./engine.worker.ts', import.meta.url), {
    type: 'module',
    name: 'sinewright engine',
  })
  const remote = wrap<EngineService>(worker)
  worker.addEventListener('error', (event) => onDeath(event.message || 'it could not be loaded'), {
    once: true,
  })
  worker.addEventListener('messageerror', () => onDeath('an answer could not be read'), { once: true })
  return {
    ...callsOn(remote),
    terminate() {
      remote[releaseProxy]()
      worker.terminate()
    },
  }
}
