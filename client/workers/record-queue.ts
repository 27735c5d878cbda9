/**
 * Which record is computed: the newest. A request that arrives while one runs makes the running one obsolete; it may
 * still finish within its grace time, so that a stream of requests is answered now and then, and is cut short
 * otherwise. Of those that wait only the newest is kept.
 */
import type { EngineConnection } from '#client/workers/engine-connection.ts'
import { abortError, type Lane } from '#client/workers/lane.ts'

type Task<Answer> = (connection: EngineConnection) => Promise<Answer>

interface Job {
  start: (lane: Lane) => Promise<void>
  abort: () => void
}

export interface RecordQueue {
  /** Settles as the task does, or rejects with an `AbortError` when it became obsolete or `signal` was aborted. */
  add<Answer>(task: Task<Answer>, signal?: AbortSignal): Promise<Answer>
  /** Gives up whatever runs or waits. */
  clear(): void
}

/** @param grace ms that a record may run, counted from its start, once a newer one waits */
export function createRecordQueue(lane: Lane, grace: number): RecordQueue {
  let running: { job: Job; since: number } | null = null
  let waiting: Job | null = null
  let timer: ReturnType<typeof setTimeout> | undefined

  function begin(job: Job) {
    running = { job, since: Date.now() }
    void job.start(lane).finally(() => {
      if (running?.job !== job) return
      running = null
      next()
    })
    lane.warm()
  }

  function next() {
    clearTimeout(timer)
    const job = waiting
    waiting = null
    if (job) begin(job)
  }

  function cut() {
    running = null
    lane.cut()
    next()
  }

  function drop(job: Job) {
    if (waiting === job) {
      waiting = null
      clearTimeout(timer)
      job.abort()
    } else if (running?.job === job) cut()
  }

  function enqueue(job: Job) {
    if (!running) return begin(job)
    waiting?.abort()
    waiting = job
    clearTimeout(timer)
    timer = setTimeout(cut, Math.max(0, running.since + grace - Date.now()))
  }

  return {
    add: (task, signal) =>
      new Promise((resolve, reject) => {
        if (signal?.aborted) return reject(abortError())
        const job: Job = {
          start: (free) =>
            free
              .call(task)
              .then(resolve, reject)
              .finally(() => signal?.removeEventListener('abort', giveUp)),
          abort: () => reject(abortError()),
        }
        const giveUp = () => drop(job)
        signal?.addEventListener('abort', giveUp, { once: true })
        enqueue(job)
      }),
    clear() {
      waiting?.abort()
      waiting = null
      clearTimeout(timer)
      if (running) cut()
    },
  }
}
