import { AsyncLocalStorage } from 'node:async_hooks'

/**
 * Lets one writer at a time into the database, in the order of asking. SQLite has a single writer; a queue in the
 * process keeps concurrent requests from failing with SQLITE_BUSY. Long work stays outside.
 */
export class WriteQueue {
  #tail: Promise<unknown> = Promise.resolve()
  readonly #inside = new AsyncLocalStorage<true>()

  /** Runs `work` when all that was asked for before has ended; settles as `work` does. */
  add<T>(work: () => Promise<T>): Promise<T> {
    if (this.#inside.getStore()) throw new Error('A write inside a write would wait for itself.')
    const result = this.#tail.then(() => this.#inside.run(true, work))
    // A failure belongs to the caller that asked; the next one starts regardless.
    this.#tail = result.catch(() => undefined)
    return result
  }

  /** Resolves when nothing is waiting any more. */
  async drained(): Promise<void> {
    let tail
    do {
      tail = this.#tail
      await tail
    } while (tail !== this.#tail)
  }
}
