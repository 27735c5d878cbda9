import { describe, expect, it } from 'vitest'
import { formatAge } from '#client/lib/dates.ts'

const now = Date.parse('2026-03-12T12:00:00Z')
const ago = (seconds: number) => formatAge(new Date(now - seconds * 1000).toISOString(), now)

describe('formatAge', () => {
  it.each([
    [5, 'just now'],
    [60, '1 minute ago'],
    [3599, '59 minutes ago'],
    [3600, '1 hour ago'],
    [86_400, 'yesterday'],
    [3 * 86_400, '3 days ago'],
    [30 * 86_400, '10 Feb 2026'],
  ])('%i s ago is "%s"', (seconds, text) => expect(ago(seconds)).toBe(text))

  it('takes a clock that runs a little ahead for now', () => expect(ago(-20)).toBe('just now'))
})
