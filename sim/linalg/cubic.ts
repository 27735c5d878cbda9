/**
 * Roots of a cubic with positive outer coefficients, as every stable-at-zero-and-infinity loop has: then one root at
 * least is real and negative. It is bracketed and split off from the side that keeps the other two accurate (G. Peters
 * & J. H. Wilkinson, "Practical problems arising in the solution of polynomial equations", 1971), so that a slow pair
 * beside a very fast root keeps its digits; all three are polished by Newton's method on the cubic itself.
 */
import { bracketedRoot } from '#sim/linalg/root.ts'
import type { Complex } from '#sim/types.ts'

/** Coefficients of p3·z³ + p2·z² + p1·z + p0. */
export interface Cubic {
  p3: number
  p2: number
  p1: number
  p0: number
}

/** Newton steps that polish a root; the start is already good to most digits. */
const polishingSteps = 3

function polished({ p3, p2, p1, p0 }: Cubic, start: Complex): Complex {
  let { re, im } = start
  for (let n = 0; n < polishingSteps; n++) {
    // Horner's rule in complex arithmetic for the value and its derivative.
    let vr = p3
    let vi = 0
    let dr = 0
    let di = 0
    for (const coefficient of [p2, p1, p0]) {
      const nextDr = dr * re - di * im + vr
      di = dr * im + di * re + vi
      dr = nextDr
      const nextVr = vr * re - vi * im + coefficient
      vi = vr * im + vi * re
      vr = nextVr
    }
    const size = dr * dr + di * di
    if (size === 0) break
    const stepRe = (vr * dr + vi * di) / size
    const stepIm = (vi * dr - vr * di) / size
    if (!(Math.hypot(stepRe, stepIm) < 0.1 * Math.hypot(re, im))) break
    re -= stepRe
    im -= stepIm
  }
  return { re, im: start.im === 0 ? 0 : im }
}

/** Roots of q2·z² + q1·z + q0 without cancellation. */
function quadraticRoots(q2: number, q1: number, q0: number): [Complex, Complex] {
  const half = -q1 / (2 * q2)
  const discriminant = half * half - q0 / q2
  if (discriminant < 0) {
    const im = Math.sqrt(-discriminant)
    return [
      { re: half, im },
      { re: half, im: -im },
    ]
  }
  const larger = half + (half >= 0 ? 1 : -1) * Math.sqrt(discriminant)
  const smaller = larger === 0 ? 0 : q0 / q2 / larger
  return [
    { re: larger, im: 0 },
    { re: smaller, im: 0 },
  ]
}

/** The three roots: the bracketed real one first, then the other two, a pair with its positive imaginary part first. */
export function cubicRoots(cubic: Cubic): [Complex, Complex, Complex] {
  const { p3, p2, p1, p0 } = cubic
  const value = (z: number) => ((p3 * z + p2) * z + p1) * z + p0
  const bound = 1 + Math.max(Math.abs(p2), Math.abs(p1), Math.abs(p0)) / p3
  const real = bracketedRoot(value, -bound, 0)
  const geometricMean = Math.cbrt(p0 / p3)
  const others =
    Math.abs(real) > geometricMean
      ? quadraticRoots(p3, (-p0 / real - p1) / real, -p0 / real)
      : quadraticRoots(p3, p2 + p3 * real, p1 + (p2 + p3 * real) * real)
  const first = polished(cubic, others[0])
  const second = others[0].im === 0 ? polished(cubic, others[1]) : { re: first.re, im: -first.im }
  return [polished(cubic, { re: real, im: 0 }), first, second]
}
