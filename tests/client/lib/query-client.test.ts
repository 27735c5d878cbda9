import { describe, expect, it } from 'vitest'
import { ApiError, OfflineError } from '#client/lib/api.ts'
import { shouldRetry } from '#client/lib/query-client.ts'

const refusal = (status: number) => new ApiError({ type: 'about:blank', title: 'No.', status, code: 'any' })

describe('retries', () => {
  it.each([400, 401, 403, 404, 409, 422, 429])('never repeats what was refused with %i', (status) => {
    expect(shouldRetry(0, refusal(status))).toBe(false)
  })

  it('repeats twice what silence or the server spoiled', () => {
    for (const error of [new OfflineError(), refusal(500), refusal(503)])
      expect([0, 1, 2].map((failures) => shouldRetry(failures, error))).toEqual([true, true, false])
  })
})
