import { compare, hash } from 'bcryptjs'
import { limits } from '#shared/limits.ts'

let last: Promise<unknown> = Promise.resolve()

/**
 * Runs one piece of hashing after another. bcryptjs computes on the process's only thread and lets others in every
 * 100 ms; fifty at once would let them in every five seconds.
 */
function oneAtATime<T>(work: () => Promise<T>): Promise<T> {
  const result = last.then(work)
  last = result.catch(() => undefined)
  return result
}

/** bcrypt hash of a password; `cost` is the base-two logarithm of its rounds. */
export const hashPassword = (password: string, cost: number): Promise<string> =>
  oneAtATime(() => hash(password, cost))

/**
 * Checks passwords with the same work whether or not the account exists, so that the time of an answer does not tell
 * which addresses have one.
 */
export function createPasswordCheck(cost: number) {
  let decoy: Promise<string> | null = null

  /** @param passwordHash the account's hash, null when there is no such account */
  return async (password: string, passwordHash: string | null): Promise<boolean> => {
    decoy ??= hashPassword('no account has this hash', cost)
    const compared = passwordHash ?? (await decoy)
    const matches = await oneAtATime(() => compare(password, compared))
    // bcrypt reads the first 72 bytes only: a longer password never matches.
    return matches && passwordHash !== null && Buffer.byteLength(password) <= limits.passwordLength[1]
  }
}
