/** Whether the cycles at the end of a record repeat. */
import type { Cycle } from '#sim/record/cycles.ts'

/** Largest distance from the level or period still to come, relative, at which a record counts as settled. */
const settledTolerance = 1e-4
/** Spread, relative, that is the integrator's own noise. */
const noise = 1e-7
/** Most rising zeros of `v1` that one period of the motion may have. */
const mostCutsPerPeriod = 4
/** The two windows compared are this share of all cycles each, within bounds. */
const windowShare = 1 / 16
const leastWindow = 4
const greatestWindow = 400

/** Greatest less least of `value` over every `lag`-th cycle of `list[from … to − 1]`, the widest of the `lag` series. */
function spread(
  list: readonly Cycle[],
  lag: number,
  from: number,
  to: number,
  value: (cycle: Cycle) => number,
): number {
  let widest = 0
  for (let phase = 0; phase < lag; phase++) {
    let least = Infinity
    let greatest = -Infinity
    for (let n = from + phase; n < to; n += lag) {
      const x = value(list[n]!)
      least = Math.min(least, x)
      greatest = Math.max(greatest, x)
    }
    widest = Math.max(widest, greatest - least)
  }
  return widest
}

/** Relative spread of peaks and period over `list[from … to − 1]`. */
function unrest(list: readonly Cycle[], lag: number, from: number, to: number): number {
  const { high, low, start, end } = list[to - 1]!
  const level = Math.max(high, -low, Number.MIN_VALUE)
  return Math.max(
    spread(list, lag, from, to, (cycle) => cycle.high) / level,
    spread(list, lag, from, to, (cycle) => cycle.low) / level,
    spread(list, lag, from, to, (cycle) => cycle.end - cycle.start) / (end - start),
  )
}

/**
 * Rising zeros of `v1` per period of the settled motion, or null while it has not settled. The spreads of two windows at
 * the end, one behind the other, give the ratio by which it shrinks from window to window; as a geometric series what
 * is still to come is spread·ratio/(1 − ratio), which must be below `settledTolerance`. Windows, not single cycles, are
 * compared because an envelope may swing as it settles.
 */
export function cutsPerPeriod(cycles: readonly Cycle[]): number | null {
  const window = Math.round(Math.min(greatestWindow, Math.max(leastWindow, cycles.length * windowShare)))
  const end = cycles.length
  for (let lag = 1; lag <= mostCutsPerPeriod; lag++) {
    const length = Math.max(window, 2 * lag)
    if (end < 2 * length) return null
    const recent = unrest(cycles, lag, end - length, end)
    if (recent < noise) return lag
    const ratio = recent / unrest(cycles, lag, end - 2 * length, end - length)
    if (ratio < 1 && recent < settledTolerance && (recent * ratio) / (1 - ratio) < settledTolerance)
      return lag
  }
  return null
}
