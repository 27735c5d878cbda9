/** Which poles of a loop fit into one picture, and how wide it must be. Rates in 1/s. */
import type { Complex } from '#sim/types.ts'

export interface PoleView {
  shown: Complex[]
  /** Too far left to be drawn to scale with the others. */
  far: Complex[]
  /** Largest real and imaginary part that the picture spans, either way. */
  real: number
  imaginary: number
}

/** Poles whose magnitude exceeds the slowest one's by more than this are left out of the picture. */
const farRatio = 20
/** Half-width of the picture over the largest part in it, real and imaginary: labels stand below their poles. */
const realRoom = 2.2
const imaginaryRoom = 1.7

/**
 * The slow poles that decide the tone are shown; the amplifier's own, orders of magnitude faster, is only told. The
 * real axis is stretched: the oscillation's growth is a fraction of its angular frequency.
 */
export function poleView(poles: readonly Complex[]): PoleView {
  const size = ({ re, im }: Complex) => Math.hypot(re, im)
  const slowest = Math.min(...poles.map(size))
  const isFar = (pole: Complex) => size(pole) > farRatio * slowest
  const shown = poles.filter((pole) => !isFar(pole))
  const largest = (part: (pole: Complex) => number) => Math.max(...shown.map((pole) => Math.abs(part(pole))))
  const imaginary = largest((pole) => pole.im)
  return {
    shown,
    far: poles.filter(isFar),
    real:
      realRoom *
      Math.max(
        largest((pole) => pole.re),
        0.005 * slowest,
      ),
    imaginary: imaginaryRoom * (imaginary || slowest),
  }
}
