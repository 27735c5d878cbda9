import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cubicRoots } from '#sim/linalg/cubic.ts'

describe('cubicRoots', () => {
  it('finds three real roots', () => {
    const roots = cubicRoots({ p3: 2, p2: 12, p1: 22, p0: 12 }).map(({ re }) => re)
    expect(roots.sort((a, b) => a - b).map((root) => Number(root.toFixed(9)))).toEqual([-3, -2, -1])
  })

  it('keeps a slow pair beside a root that is 10⁹ times faster', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -0.9, max: 0.9, noNaN: true }),
        fc.integer({ min: 0, max: 9 }),
        (damping, decade) => {
          const fast = -(10 ** decade) * 1.7
          // (z − fast)(z² − 2·damping·z + 1)
          const roots = cubicRoots({
            p3: 1,
            p2: -2 * damping - fast,
            p1: 1 + 2 * damping * fast,
            p0: -fast,
          })
          const pair = roots.find(({ im }) => im > 0)!
          expect(Math.abs(pair.re - damping)).toBeLessThan(1e-13)
          expect(Math.abs(pair.im - Math.sqrt(1 - damping * damping))).toBeLessThan(1e-12)
        },
      ),
      { seed: 7 },
    )
  })
})
