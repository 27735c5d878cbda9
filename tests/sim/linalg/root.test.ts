import { describe, expect, it } from 'vitest'
import { bracketedRoot } from '#sim/linalg/root.ts'

describe('bracketedRoot', () => {
  it('finds roots to the last bits', () => {
    expect(Math.abs(bracketedRoot(Math.cos, 1, 2) - Math.PI / 2)).toBeLessThan(4e-16)
    expect(Math.abs(bracketedRoot((x) => x ** 9, -1, 2))).toBeLessThan(1e-15)
    expect(Math.abs(bracketedRoot((x) => Math.exp(30 * x) - 2, -5, 5) - Math.LN2 / 30)).toBeLessThan(1e-16)
  })

  it('returns an end that is a root', () => {
    expect(bracketedRoot((x) => x - 1, 1, 2)).toBe(1)
    expect(bracketedRoot((x) => x - 2, 1, 2)).toBe(2)
  })

  it('refuses ends of one sign', () => {
    expect(() => bracketedRoot((x) => x * x + 1, -1, 1)).toThrow(RangeError)
  })
})
