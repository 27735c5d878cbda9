/** Where the gain trim may go and what its zones mean. Gain margins are ratios: 0.01 is 1 %. */
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { SmallSignal } from '#sim/types.ts'

/** Travel of the trim around the critical gain, as gain margins; it is widened to hold the present value. */
const travel = { below: -0.03, above: 0.06 }
/** Widening beyond the present value, as a share of its distance from critical. */
const spare = 0.15
/**
 * Up to this margin a bare loop's clipping stays mild. For a sine that only its rails limit, distortion is about twice
 * the margin (describing function of a clipped sine), so this is near 3 %. Common practice, no source.
 */
const mildMargin = 0.015

export interface TrimRange {
  /** Feedback R at both ends of the travel, Ω. */
  least: number
  greatest: number
  /** Feedback R at which the loop just sustains itself, Ω. */
  critical: number
  /** Feedback R up to which a bare loop clips mildly, Ω; null where something other than the rails holds the level. */
  mild: number | null
}

/** Feedback R at a gain margin; the zero-signal gain moves with it as Rf/Rg does. Ω. */
function feedbackAt(margin: number, circuit: Circuit, linear: SmallSignal): number {
  const gain = linear.criticalGain * (1 + margin)
  return circuit.gain.feedbackR + (gain - linear.gain) * circuit.gain.groundR
}

/** The feedback R that makes the loop just sustain itself, Ω; null when no gain does. */
export function criticalFeedback(circuit: Circuit, linear: SmallSignal): number | null {
  const critical = feedbackAt(0, circuit, linear)
  return Number.isFinite(critical) && critical > 0 ? critical : null
}

/** The trim's travel, or null when no gain sustains this loop. */
export function trimRange(circuit: Circuit, linear: SmallSignal): TrimRange | null {
  const critical = criticalFeedback(circuit, linear)
  if (critical === null) return null
  const margin = linear.gainMargin
  const least = feedbackAt(Math.min(travel.below, margin * (1 + spare)), circuit, linear)
  const greatest = feedbackAt(Math.max(travel.above, margin * (1 + spare)), circuit, linear)
  return {
    least: Math.max(least, critical * 1e-3),
    greatest,
    critical,
    mild: circuit.amplitudeControl.kind === 'none' ? feedbackAt(mildMargin, circuit, linear) : null,
  }
}
