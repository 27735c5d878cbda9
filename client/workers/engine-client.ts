/**
 * The one owner of the engine's workers. Two lanes: a quick worker that answers small-signal questions at once, and a
 * record worker with a warm spare behind it, so that giving up a record costs no start of a worker.
 */
import { proxy } from 'comlink'
import type { EngineClient } from '#client/lib/engine-context.ts'
import { connectWorker, type Connect } from '#client/workers/engine-connection.ts'
import { createLane } from '#client/workers/lane.ts'
import { createRecordQueue } from '#client/workers/record-queue.ts'

/**
 * How long (ms since its start) a record may still run once a newer request waits. Longer than the record of an ordinary
 * 1 kHz circuit by the stepping integrator on a slow machine, so that the figures follow a moving trim slider and the
 * worker stays warm; a record of many seconds, on the other hand, has long had its grace when the next edit comes.
 */
const graceTime = 1000

export interface OwnedEngine extends EngineClient {
  /** Ends every worker. Requests under way reject with an `AbortError`. */
  dispose(): void
}

export function createEngineClient(connect: Connect = connectWorker, grace = graceTime): OwnedEngine {
  const quick = createLane(connect)
  const records = createLane(connect)
  const queue = createRecordQueue(records, grace)
  return {
    smallSignal: (circuit) => quick.call((connection) => connection.smallSignal(circuit)),
    run(inputs, { signal, onProgress } = {}) {
      // Progress comes through a port of its own and may be overtaken by the answer: then it is no news.
      let settled = false
      const report = onProgress && proxy((done: number) => void (settled || onProgress(done)))
      return queue.add((connection) => connection.run(inputs, report), signal).finally(() => (settled = true))
    },
    dispose() {
      queue.clear()
      quick.end()
      records.end()
    },
  }
}
