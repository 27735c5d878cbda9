/** Whether the cycles at the end of a record repeat. */
import type { Cycle } from '#sim/record/cycles.ts'

/** Largest distance from the level or period still to come, relative, at which a record counts as settled. */
export const settledTolerance = 1e-4
/** Change from cycle to cycle, relative, that is the integrator's own noise. */
const noise = 1e-7
/** Most rising zeros of `v1` that one period of the motion may have. */
const mostCutsPerPeriod = 4
/** The two windows compared are this share of all cycles each, within bounds. */
const windowShare = 1 / 16
const leastWindow = 4
const greatestWindow = 64

/** Largest relative change of peak or period between cycles `lag` apart, over `list[from … to − 1]`. */
function largestChange(list: readonly Cycle[], lag: number, from: number, to: number): number {
  let largest = 0
  for (let n = from; n < to; n++) {
    const now = list[n]!
    const then = list[n - lag]!
    const level = Math.max(now.high, -now.low, Number.MIN_VALUE)
    const length = now.end - now.start
    largest = Math.max(
      largest,
      Math.abs(now.high - then.high) / level,
      Math.abs(now.low - then.low) / level,
      Math.abs(length - (then.end - then.start)) / length,
    )
  }
  return largest
}

/**
 * Rising zeros of `v1` per period of the settled motion, or null while it has not settled. The changes of two windows at
 * the end, one behind the other, give the ratio by which changes shrink from cycle to cycle; as a geometric series they
 * leave change/(1 − ratio) still to come, which must be below `settledTolerance`.
 */
export function cutsPerPeriod(cycles: readonly Cycle[]): number | null {
  const window = Math.round(Math.min(greatestWindow, Math.max(leastWindow, cycles.length * windowShare)))
  for (let lag = 1; lag <= mostCutsPerPeriod; lag++) {
    const end = cycles.length
    if (end < 2 * window + lag) return null
    const recent = largestChange(cycles, lag, end - window, end)
    if (recent < noise) return lag
    const earlier = largestChange(cycles, lag, end - 2 * window, end - window)
    const ratio = Math.pow(recent / earlier, lag / window)
    if (ratio < 1 && recent / (1 - ratio) < settledTolerance) return lag
  }
  return null
}
