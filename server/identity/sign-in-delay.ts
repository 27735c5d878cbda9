import type { Clock } from '#server/clock.ts'

/** Wrong passwords that cost nothing: people mistype. */
const freeAttempts = 3
/** Longest wait, milliseconds. */
const longest = 60_000
/** A failure is forgotten after this time, milliseconds. */
const memory = 60 * 60_000
/** Accounts and addresses remembered at most; the oldest go first. */
const capacity = 10_000

interface Failures {
  count: number
  lastAt: number
}

/**
 * Makes guessing slow: after three failures the next attempt on an account from the same address has to wait 1 s,
 * then 2, 4, … up to a minute. Counted per account *and* address, so that a stranger's guesses never lock the owner
 * out. Kept in memory: a restart forgives.
 */
export function createSignInDelay(clock: Clock) {
  const failures = new Map<string, Failures>()
  const keyOf = (email: string, address: string | undefined) => `${address ?? ''} ${email}`

  return {
    /**
     * Asks for one attempt and books it as failed until `succeed` says otherwise, so that attempts at the same moment
     * count too.
     * @returns whole seconds still to wait, 0 when the attempt may go on
     */
    attempt(email: string, address: string | undefined): number {
      const now = clock().getTime()
      const key = keyOf(email, address)
      const known = failures.get(key)
      const past = known && now - known.lastAt < memory ? known : { count: 0, lastAt: 0 }
      const excess = past.count - freeAttempts
      const wait = excess < 0 ? 0 : Math.min(1000 * 2 ** excess, longest) - (now - past.lastAt)
      if (wait > 0) return Math.ceil(wait / 1000)
      failures.delete(key)
      failures.set(key, { count: past.count + 1, lastAt: now })
      const [oldest] = failures.keys()
      if (failures.size > capacity && oldest !== undefined) failures.delete(oldest)
      return 0
    },

    succeed(email: string, address: string | undefined): void {
      failures.delete(keyOf(email, address))
    },
  }
}
