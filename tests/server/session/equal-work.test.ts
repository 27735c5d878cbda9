/** Whether an account exists must not show in the work of a refusal. Counted in bcrypt calls and rounds, not in time. */
import type * as bcrypt from 'bcryptjs'
import { compare, getRounds, hash } from 'bcryptjs'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { createPasswordCheck } from '#server/identity/passwords.ts'

vi.mock('bcryptjs', async (original) => {
  const actual = await original<typeof bcrypt>()
  return { ...actual, compare: vi.fn(actual.compare) }
})
afterEach(() => vi.mocked(compare).mockClear())

describe('the password check', () => {
  it('makes one comparison of the same cost with and without an account', async () => {
    const cost = 5
    const isRight = createPasswordCheck(cost)
    expect(await isRight('a wrong guess', await hash('the password', cost))).toBe(false)
    expect(await isRight('a wrong guess', null)).toBe(false)
    const rounds = vi.mocked(compare).mock.calls.map(([, compared]) => getRounds(compared))
    expect(rounds).toEqual([cost, cost])
  })
})
