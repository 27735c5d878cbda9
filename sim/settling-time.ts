import type { Circuit } from '#shared/schemas/circuit.ts'
import { tungstenExponent } from '#sim/circuit/lamp.ts'
import { naturalPeriod } from '#sim/circuit/loop-polynomial.ts'
import type { SmallSignal } from '#sim/types.ts'

/** Natural logarithm of how far the distance from the settled level should shrink. */
const shrink = Math.log(3e4)
/** A clipping loop settles within some periods of its first touch. */
const clippingPeriods = 8

/**
 * About how long the level takes to settle once the output has grown, s. Good enough to choose a record's length; what
 * has settled is decided from the record itself.
 *
 * Estimates of our own, no source but what they name:
 *
 * - rails: a few periods;
 * - diodes: a soft limiter near its threshold approaches its level at twice the growth rate (as van der Pol's equation);
 * - lamp: the envelope decays at (1 + n)/(2τ) with τ = Cth/Gth and n = d ln R/d ln P, for an ideal amplifier and equal
 *   arms; the filament settles where its resistance makes the gain critical.
 */
export function settlingTime(circuit: Circuit, linear: SmallSignal): number {
  const { amplitudeControl: control, gain } = circuit
  const periods = clippingPeriods * naturalPeriod(circuit.network)
  switch (control.kind) {
    case 'none':
      return periods
    case 'diodes':
      return periods + shrink / (2 * linear.growthRate)
    case 'lamp': {
      const exponent = control.exponent ?? tungstenExponent
      const hotR = gain.feedbackR / (linear.criticalGain - 1)
      const hot = control.coldTemperature * Math.pow(hotR / control.coldR, 1 / exponent)
      const steepness = Math.max(0, (exponent * (hot - control.ambientTemperature)) / hot)
      const timeConstant = control.thermalCapacity / control.thermalConductance
      return periods + (shrink * 2 * timeConstant) / (1 + steepness)
    }
  }
}
