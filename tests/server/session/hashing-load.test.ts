/** Hashing must not shut everybody else out, however many attempts come at once. Counted, not timed. */
import type * as bcrypt from 'bcryptjs'
import { compare, hash } from 'bcryptjs'
import { describe, expect, it, vi } from 'vitest'
import { createPasswordCheck, hashPassword } from '#server/identity/passwords.ts'

let underWay = 0
let most = 0
vi.mock('bcryptjs', async (original) => {
  const actual = await original<typeof bcrypt>()
  const counted =
    <A extends unknown[], T>(work: (...args: A) => Promise<T>) =>
    async (...args: A): Promise<T> => {
      most = Math.max(most, ++underWay)
      return work(...args).finally(() => (underWay -= 1))
    }
  return { ...actual, compare: vi.fn(counted(actual.compare)), hash: vi.fn(counted(actual.hash)) }
})

describe('many passwords at once', () => {
  it('are hashed one after the other, a failure does not hold up the next', async () => {
    const isRight = createPasswordCheck(4)
    const stored = await hashPassword('the password', 4)
    vi.mocked(hash).mockRejectedValueOnce(new Error('no entropy'))
    const failing = hashPassword('another', 4)
    const guesses = ['a guess', 'the password', 'b', 'c', 'd'].map((guess) => isRight(guess, stored))
    await expect(failing).rejects.toThrow('no entropy')
    expect(await Promise.all(guesses)).toEqual([false, true, false, false, false])
    expect(vi.mocked(compare)).toHaveBeenCalledTimes(5)
    expect(most).toBe(1)
  })
})
