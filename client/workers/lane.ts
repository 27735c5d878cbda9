/** A worker that is started when first needed, replaced when it dies, and may be cut short. */
import type { Connect, EngineConnection } from '#client/workers/engine-connection.ts'

/** A promise that its owner can reject: a call into a worker that was ended never settles by itself. */
interface PendingCall {
  reject: (error: Error) => void
}

interface Held {
  connection: EngineConnection
  alive: boolean
  pending: Set<PendingCall>
}

export interface Lane {
  /** Calls the lane's worker. Rejects with a sentence for the user when the worker dies. */
  call<Answer>(task: (connection: EngineConnection) => Promise<Answer>): Promise<Answer>
  /** Starts the next worker ahead of its need. */
  warm(): void
  /** Ends the worker under way; its calls reject with an `AbortError`. The next call takes the spare. */
  cut(): void
  /** Ends the worker and the spare. */
  end(): void
}

export const abortError = () => new DOMException('The computation was given up.', 'AbortError')

const deathSentence = (reason: string) =>
  `The computation stopped unexpectedly (${reason}). Your values are kept; the next change starts it again.`

export function createLane(connect: Connect): Lane {
  let current: Held | null = null
  let spare: Held | null = null

  function start(): Held {
    const held: Held = {
      pending: new Set(),
      alive: true,
      connection: connect((reason) => {
        held.alive = false
        close(held, new Error(deathSentence(reason)))
      }),
    }
    return held
  }

  function close(held: Held, error: Error) {
    held.connection.terminate()
    if (held === current) current = null
    if (held === spare) spare = null
    const calls = [...held.pending]
    held.pending.clear()
    for (const call of calls) call.reject(error)
  }

  function worker(): Held {
    if (!current) {
      current = spare ?? start()
      spare = null
    }
    return current
  }

  return {
    call: (task) =>
      new Promise((resolve, reject) => {
        const held = worker()
        const call = { reject }
        held.pending.add(call)
        task(held.connection).then(
          (answer) => {
            held.pending.delete(call)
            resolve(answer)
          },
          // Refused by the channel itself, for the service turns its own errors into failures.
          (error: unknown) => {
            held.pending.delete(call)
            reject(new Error(deathSentence(error instanceof Error ? error.message : String(error))))
          },
        )
      }),
    warm() {
      spare ??= start()
    },
    cut() {
      if (current) close(current, abortError())
    },
    end() {
      if (current) close(current, abortError())
      if (spare) close(spare, abortError())
    },
  }
}
