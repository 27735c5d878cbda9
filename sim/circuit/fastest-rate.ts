import type { Circuit } from '#shared/schemas/circuit.ts'
import { characteristic, loopOf } from '#sim/circuit/loop-polynomial.ts'
import { cubicRoots } from '#sim/linalg/cubic.ts'
import type { SmallSignal } from '#sim/types.ts'

/** How far below the critical gain a hot filament is reckoned to push the gain while its level overshoots. */
const lampOvershoot = 0.9

/**
 * Modulus of the fastest pole that the loop has at any signal, 1/s. The amplifier's own pole lies near ωt/gain, so the
 * least gain counts: with the diodes short-circuited, or with the filament hotter than its resting point.
 */
export function fastestRate(circuit: Circuit, linear: SmallSignal): number {
  const { amplitudeControl: control, gain } = circuit
  let least = linear.gain
  if (control.kind === 'diodes') least = 1 + control.seriesR / gain.groundR
  if (control.kind === 'lamp') least = Math.min(linear.gain, lampOvershoot * linear.criticalGain)
  const loop = loopOf(circuit)
  return cubicRoots(characteristic(loop, least)).reduce(
    (most, { re, im }) => Math.max(most, Math.hypot(re, im) * loop.naturalRate),
    0,
  )
}
