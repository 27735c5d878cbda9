/** How much work an explicit integrator may take, and a forecast of it. */
import type { SmallSignal } from '#sim/types.ts'

/** Evaluations of the equations in one computation: some seconds. */
export const mostEvaluations = 24_000_000
/** Evaluations per time constant of the fastest pole, whose decay limits an explicit integrator's steps. */
const perTimeConstant = 2.2
/** Evaluations per period where accuracy does. */
const perPeriod = 1500

/** Evaluations that `duration` seconds will take, about. */
export function predictedEvaluations({ poles, frequency }: SmallSignal, duration: number): number {
  const fastest = poles.reduce((most, { re, im }) => Math.max(most, Math.hypot(re, im)), 0)
  return duration * Math.max(fastest * perTimeConstant, frequency * perPeriod)
}

/** Evaluations that a record whose length is chosen here may take, unless it would show next to nothing. */
const automaticEvaluations = 10_000_000

/** Longest record that is cheap enough to be chosen without being asked for, s. */
export function affordableDuration(linear: SmallSignal): number {
  return automaticEvaluations / predictedEvaluations(linear, 1)
}
