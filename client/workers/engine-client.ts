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
 * How long (ms since its start) a record may still run once a newer request waits: long enough for the record of an
 * ordinary 1 kHz circuit by the stepping integrator, so that the figures follow a moving trim slider; short enough
 * that nobody waits noticeably for the values that he or she stopped at.
 */
export const graceTime = 400

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
    run: (inputs, { signal, onProgress } = {}) =>
      queue.add((connection) => connection.run(inputs, onProgress && proxy(onProgress)), signal),
    dispose() {
      queue.clear()
      quick.end()
      records.end()
    },
  }
}
