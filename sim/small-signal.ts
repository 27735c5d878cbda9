/** What the loop does before anything limits it. */
import type { Circuit } from '#shared/schemas/circuit.ts'
import { gainPathOf } from '#sim/circuit/gain-path-of.ts'
import { characteristic, criticalGain, loopOf } from '#sim/circuit/loop-polynomial.ts'
import { cubicRoots } from '#sim/linalg/cubic.ts'
import type { Complex, SmallSignal } from '#sim/types.ts'

/** The root with the largest real part; of a pair the one with positive imaginary part. */
function leading(poles: readonly Complex[]): Complex {
  return poles.reduce((best, pole) => (pole.re > best.re ? pole : best))
}

/**
 * Poles, growth rate and critical gain of the linear loop with the finite amplifier. Three poles: at zero signal a
 * filament's heating is of second order, so its temperature takes no part in the loop.
 * `criticalGain` is Infinity (and `gainMargin` −1) when no gain sustains the loop with this amplifier.
 */
export function smallSignal(circuit: Circuit): SmallSignal {
  const { feedbackR, groundR } = gainPathOf(circuit).smallSignal
  const { seriesR, seriesC, shuntR, shuntC } = circuit.network
  const loop = loopOf(circuit)
  const gain = 1 + feedbackR / groundR
  const critical = criticalGain(loop)
  const poles = cubicRoots(characteristic(loop, gain)).map(({ re, im }) => ({
    re: re * loop.naturalRate,
    im: im * loop.naturalRate,
  }))
  const dominant = leading(poles)
  return {
    gain,
    criticalGain: critical,
    idealCriticalGain: 1 + seriesR / shuntR + shuntC / seriesC,
    gainMargin: gain / critical - 1,
    growthRate: dominant.re,
    frequency: Math.abs(dominant.im) / (2 * Math.PI),
    poles,
    starts: dominant.re > 0,
  }
}
