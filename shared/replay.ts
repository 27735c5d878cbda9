/**
 * Replay: is a run that was computed again the run that was stored? Pure comparison of two results, figure by figure
 * and column by column, against tolerances that are stated here and in `figures.ts`.
 */
import { figure, figureKeys, type FigureKey, type Figures } from '#shared/figures.ts'

/**
 * Largest waveform deviation that passes, as a share of the stored column's greatest magnitude. As wide as the widest
 * relative tolerance of a figure: two integrators that agree to 1e-9 a step drift apart in phase by far less.
 */
export const waveformTolerance = 1e-4

/** One result as replay sees it: figures, and columns on an even grid from power-on (s; V unless named otherwise). */
export interface ReplayResult {
  figures: Figures
  sampleInterval: number
  columns: readonly Float64Array[]
}

export interface FigureComparison {
  key: FigureKey
  stored: number | null
  replayed: number | null
  /** replayed − stored, in the figure's unit; null when either is missing. */
  difference: number | null
  /** Greatest |difference| that passes, in the figure's unit; null when the stored one is missing. */
  tolerance: number | null
  passes: boolean
}

export interface ColumnComparison {
  /** Greatest |replayed − stored|, in the column's unit. */
  deviation: number
  /** When it occurs, s from power-on. */
  time: number
  /** Greatest |stored|, in the column's unit. */
  peak: number
  /** deviation / peak; 0 when both are zero. */
  relative: number
  passes: boolean
}

export interface ReplayComparison {
  figures: FigureComparison[]
  /** One for each stored column; null when the two records do not lie on the same grid. */
  columns: ColumnComparison[] | null
  passes: boolean
}

/** One figure against its stated tolerance. Missing in both passes, missing in one alone does not. */
export function compareFigure(
  key: FigureKey,
  stored: number | null,
  replayed: number | null,
): FigureComparison {
  const allowed = figure(key).tolerance
  const tolerance = stored === null ? null : Math.max(allowed.relative * Math.abs(stored), allowed.absolute)
  if (stored === null || replayed === null || tolerance === null)
    return { key, stored, replayed, difference: null, tolerance, passes: stored === replayed }
  const difference = replayed - stored
  return { key, stored, replayed, difference, tolerance, passes: Math.abs(difference) <= tolerance }
}

/** Largest deviation between two columns of equal length; a value that is not a number is an infinite deviation. */
export function compareColumn(
  stored: Float64Array,
  replayed: Float64Array,
  sampleInterval: number,
): ColumnComparison {
  let deviation = 0
  let at = 0
  let peak = 0
  for (let i = 0; i < stored.length; i++) {
    const value = stored[i]!
    const difference = Math.abs(replayed[i]! - value)
    const size = Number.isNaN(difference) ? Infinity : difference
    if (size > deviation) {
      deviation = size
      at = i
    }
    peak = Math.max(peak, Math.abs(value))
  }
  const relative = deviation === 0 ? 0 : deviation / peak
  return { deviation, time: at * sampleInterval, peak, relative, passes: relative <= waveformTolerance }
}

function sameGrid(stored: ReplayResult, replayed: ReplayResult): boolean {
  return (
    stored.columns.length === replayed.columns.length &&
    stored.columns.every((column, index) => column.length === replayed.columns[index]!.length) &&
    Math.abs(stored.sampleInterval - replayed.sampleInterval) <= 1e-12 * stored.sampleInterval
  )
}

/** The whole comparison; it passes only when every figure and every column passes. */
export function compareReplay(stored: ReplayResult, replayed: ReplayResult): ReplayComparison {
  const figures = figureKeys.map((key) => compareFigure(key, stored.figures[key], replayed.figures[key]))
  const columns = sameGrid(stored, replayed)
    ? stored.columns.map((column, index) =>
        compareColumn(column, replayed.columns[index]!, stored.sampleInterval),
      )
    : null
  const passes = figures.every((row) => row.passes) && columns !== null && columns.every((row) => row.passes)
  return { figures, columns, passes }
}
