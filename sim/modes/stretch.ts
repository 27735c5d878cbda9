/**
 * One accepted step of the integrator inside one mode, and the search for the first guard that fires in it.
 *
 * The step is looked at in pieces short enough that a guard has at most one turning point in each. A guard fires where
 * it changes sign, and also where it dips below zero and comes back between two looks, which its derivative shows. A
 * guard that starts at zero (a rail just left, a slew limit just passed) fires only once it is clearly negative.
 */
import { bracketedRoot } from '#sim/linalg/root.ts'
import type { Guard } from '#sim/modes/mode.ts'
import type { Dense } from '#sim/ode/integrate.ts'
import type { Mode } from '#sim/types.ts'

/** States along a step, read through the integrator's dense output. */
export class Stretch {
  from = 0
  to = 0
  mode: Mode = 'linear'
  private end: readonly number[] = []
  private dense: Dense = () => NaN
  private readonly state: number[]

  constructor(readonly dimension: number) {
    this.state = new Array<number>(dimension).fill(0)
  }

  /** The step from `from` to `to` (s), with the state at its end. */
  set(mode: Mode, from: number, to: number, end: readonly number[], dense: Dense): void {
    this.mode = mode
    this.from = from
    this.to = to
    this.end = end
    this.dense = dense
  }

  /** One component at `t`. */
  component(index: number, t: number): number {
    return t === this.to ? this.end[index]! : this.dense(index, t)
  }

  /** The state at `t`, in an array that the next call overwrites. */
  at(t: number): readonly number[] {
    if (t === this.to) return this.end
    for (let i = 0; i < this.dimension; i++) this.state[i] = this.dense(i, t)
    return this.state
  }
}

/** A guard that fired, and when, s. */
export interface Firing {
  guard: Guard
  time: number
}

/** A guard with what it showed at the last look. */
interface WatchedGuard {
  guard: Guard
  value: number
  rate: number
}

/** Begins to watch a guard at `t` s. */
export function watch(guard: Guard, t: number, y: readonly number[]): WatchedGuard {
  return { guard, value: guard.value(t, y), rate: guard.rate(t, y) }
}

/** Looks at every guard at `b` after the look at `a`, and returns the first to fire in between, or null. */
export function firstFiring(
  watched: readonly WatchedGuard[],
  stretch: Stretch,
  a: number,
  b: number,
): Firing | null {
  let first: Firing | null = null
  for (const entry of watched) {
    const { guard, value: before, rate: rateBefore } = entry
    const y = stretch.at(b)
    entry.value = guard.value(b, y)
    entry.rate = guard.rate(b, y)
    let until = b
    let least = entry.value
    const dips = least >= 0 && rateBefore < 0 && entry.rate > 0
    if (dips && mightReachZero(before, rateBefore, least, entry.rate, b - a)) {
      until = bracketedRoot((t) => guard.rate(t, stretch.at(t)), a, b)
      least = guard.value(until, stretch.at(until))
    }
    const fires = least < 0 && (before > 0 || least < -guard.resolution)
    if (!fires) continue
    const time = before > 0 ? bracketedRoot((t) => guard.value(t, stretch.at(t)), a, until) : a
    if (!first || time < first.time) first = { guard, time }
  }
  return first
}

/** Whether a guard that falls and rises again could have touched zero: the tangents at both ends meet below it. */
function mightReachZero(
  before: number,
  rateBefore: number,
  after: number,
  rateAfter: number,
  length: number,
): boolean {
  const meeting = (after - before - rateAfter * length) / (rateBefore - rateAfter)
  return before + rateBefore * meeting <= 0.5 * Math.min(before, after)
}
