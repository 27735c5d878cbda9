import type { Circuit } from '#shared/schemas/circuit.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'

/** Least start that is reckoned with, V: below it everything is rounding. */
const least = 1e-9

/**
 * About the amplitude at the output with which the oscillation begins, V. For rest with the amplifier's offset Vos it is
 * K²·Vos·√(RpCs/(RsCp)), K the closed-loop gain: twice the residue of the ideal loop's step response at its growing pole,
 * near the critical gain. For a kick, the kick times K.
 */
export function startLevel({ network, amplifier }: Circuit, stimulus: Stimulus, gain: number): number {
  const { seriesR, seriesC, shuntR, shuntC } = network
  if (stimulus.kind === 'kick') return Math.max(least, Math.abs(stimulus.voltage) * gain)
  const ratio = Math.sqrt(shuntR / seriesR) * Math.sqrt(seriesC / shuntC)
  return Math.max(least, gain * gain * Math.abs(amplifier.offset) * ratio)
}
