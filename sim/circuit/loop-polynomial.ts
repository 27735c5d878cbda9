/**
 * The loop at zero signal as a polynomial. With the network's v1/vo = s·c/(a2·s² + a1·s + 1), where
 * a2 = RsRpCsCp, a1 = RsCs + RpCp + RpCs and c = RpCs, and the amplifier's vo·(s/ωt + b) = v1, where
 * b = 1/gain + 1/A0, the poles solve
 *
 *     (s/ωt + b)(a2·s² + a1·s + 1) − c·s = 0
 *
 * Everything is in units of ω0 = 1/√a2, so that no circuit overflows it.
 */
import type { Circuit, Network } from '#shared/schemas/circuit.ts'
import type { Cubic } from '#sim/linalg/cubic.ts'

interface Loop {
  /** 1/√(RsRpCsCp), rad/s. */
  naturalRate: number
  /** a1·ω0. */
  damping: number
  /** c·ω0. */
  coupling: number
  /** ω0/ωt. */
  lag: number
  /** 1/A0. */
  leak: number
}

/** Angular frequency ω0 of the network: 1/√(RsRpCsCp), rad/s. Two roots, so that no product overflows. */
export function naturalRate({ seriesR, seriesC, shuntR, shuntC }: Network): number {
  return 1 / (Math.sqrt(seriesR * seriesC) * Math.sqrt(shuntR * shuntC))
}

/** Period of the network's own frequency, 2π/ω0, s. */
export function naturalPeriod(network: Network): number {
  return (2 * Math.PI) / naturalRate(network)
}

/** The loop's coefficients in units of ω0, from the circuit's parts. */
export function loopOf({ network, amplifier }: Circuit): Loop {
  const { seriesR, seriesC, shuntR, shuntC } = network
  const rate = naturalRate(network)
  return {
    naturalRate: rate,
    damping: (seriesR * seriesC + shuntR * shuntC + shuntR * seriesC) * rate,
    coupling: shuntR * seriesC * rate,
    lag: rate / (2 * Math.PI * amplifier.gainBandwidth),
    leak: 1 / amplifier.openLoopGain,
  }
}

/** Characteristic polynomial in s/ω0 at a closed-loop gain. */
export function characteristic({ damping, coupling, lag, leak }: Loop, gain: number): Cubic {
  const b = 1 / gain + leak
  return { p3: lag, p2: lag * damping + b, p1: lag + b * damping - coupling, p0: b }
}

/**
 * The gain at which the growth rate is zero. Two poles lie on the imaginary axis when p2·p1 = p3·p0 (Routh, 1877), a
 * quadratic in b = 1/gain + 1/A0 with one positive root while the amplifier is faster than RpCs:
 *
 *     a1·b² + (a1²·lag − c)·b + a1·lag·(lag − c) = 0     (scaled by ω0)
 *
 * Infinity when no gain sustains the loop: the amplifier is too slow, or its open-loop gain too small.
 */
export function criticalGain({ damping, coupling, lag, leak }: Loop): number {
  if (lag >= coupling) return Infinity
  const half = (coupling - damping * damping * lag) / 2
  const constant = damping * damping * lag * (lag - coupling)
  const root = Math.sqrt(half * half - constant)
  const b = half >= 0 ? (half + root) / damping : constant / ((half - root) * damping)
  return b > leak ? 1 / (b - leak) : Infinity
}
