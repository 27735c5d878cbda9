/** How much work an explicit integrator may take, and a forecast of it. */
import type { Circuit } from '#shared/schemas/circuit.ts'
import { fastestRate } from '#sim/circuit/fastest-rate.ts'
import type { SmallSignal } from '#sim/types.ts'

/** Evaluations of the equations in one computation: some seconds. */
export const mostEvaluations = 24_000_000
/** Evaluations per time constant of the fastest pole, whose decay limits an explicit integrator's steps. */
const perTimeConstant = 2.2
/** Evaluations per period where accuracy does. */
const perPeriod = 1500

/** Evaluations that `duration` seconds will take, about. */
export function predictedEvaluations(circuit: Circuit, linear: SmallSignal, duration: number): number {
  return duration * Math.max(fastestRate(circuit, linear) * perTimeConstant, linear.frequency * perPeriod)
}

/** Evaluations that a record whose length is chosen here may take, unless it would show next to nothing. */
const automaticEvaluations = 10_000_000

/** Longest record that is cheap enough to be chosen without being asked for, s. */
export function affordableDuration(circuit: Circuit, linear: SmallSignal): number {
  return automaticEvaluations / predictedEvaluations(circuit, linear, 1)
}

/** Longest record that is not refused as too much work, s. */
export function allowedDuration(circuit: Circuit, linear: SmallSignal): number {
  return mostEvaluations / predictedEvaluations(circuit, linear, 1)
}
