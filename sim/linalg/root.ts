/**
 * Root of `f` between `a` and `b`, where it has opposite signs, to the last bits of the abscissa.
 * Brent's method (R. P. Brent, Algorithms for Minimization without Derivatives, 1973, chapter 4): inverse quadratic
 * interpolation safeguarded by bisection. An end at which `f` is zero is returned at once.
 * @throws RangeError when the signs do not differ
 */
export function bracketedRoot(f: (x: number) => number, a: number, b: number): number {
  let fa = f(a)
  let fb = f(b)
  if (fa === 0) return a
  if (fb === 0) return b
  if (fa > 0 === fb > 0) throw new RangeError(`no sign change between ${a} and ${b}`)
  let c = a
  let fc = fa
  let step = b - a
  let previous = step
  for (let i = 0; i < 200; i++) {
    if (fb > 0 === fc > 0) {
      c = a
      fc = fa
      step = previous = b - a
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      a = b
      b = c
      c = a
      fa = fb
      fb = fc
      fc = fa
    }
    const resolution = Number.EPSILON * Math.abs(b)
    const half = (c - b) / 2
    if (Math.abs(half) <= resolution || fb === 0) return b
    if (Math.abs(previous) >= resolution && Math.abs(fa) > Math.abs(fb)) {
      let numerator: number
      let denominator: number
      const s = fb / fa
      if (a === c) {
        numerator = 2 * half * s
        denominator = 1 - s
      } else {
        const q = fa / fc
        const r = fb / fc
        numerator = s * (2 * half * q * (q - r) - (b - a) * (r - 1))
        denominator = (q - 1) * (r - 1) * (s - 1)
      }
      if (numerator > 0) denominator = -denominator
      else numerator = -numerator
      const accepted =
        2 * numerator <
        Math.min(
          3 * half * denominator - Math.abs(resolution * denominator),
          Math.abs(previous * denominator),
        )
      previous = accepted ? step : half
      step = accepted ? numerator / denominator : half
    } else {
      step = previous = half
    }
    a = b
    fa = fb
    b += Math.abs(step) > resolution ? step : half > 0 ? resolution : -resolution
    fb = f(b)
  }
  return b
}
