import { describe, expect, it } from 'vitest'
import { readId } from '#client/lib/read-id.ts'

describe('readId', () => {
  it('reads a positive whole number', () => {
    expect(readId('1')).toBe(1)
    expect(readId('408')).toBe(408)
  })

  it.each([null, undefined, '', '0', '-1', '1.5', '1e3', ' 1', 'compare', '12345678901234567'])(
    'refuses %j',
    (text) => expect(readId(text)).toBeNull(),
  )
})
