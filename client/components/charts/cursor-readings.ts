/** What the two cursors read off a record. */
import type { Cursors, WaveformSeries } from '#client/components/charts/chart-types.ts'

/** Value at `time` s on the straight line between neighbouring samples; null outside the record. */
export function valueAt(values: Float64Array, sampleInterval: number, time: number): number | null {
  const position = time / sampleInterval
  const index = Math.min(values.length - 2, Math.floor(position))
  // A cursor at the very end may lie beyond it by rounding.
  if (position < 0 || position > values.length - 1 + 1e-6) return null
  const here = values[Math.max(0, index)]
  const next = values[index + 1]
  if (here === undefined || next === undefined) return here ?? null
  return here + (next - here) * (position - index)
}

export interface SeriesReading {
  key: string
  label: string
  unit: string
  /** At the first and second cursor, and second less first; null where there is none. */
  first: number | null
  second: number | null
  difference: number | null
}

export interface CursorReadings {
  /** Second less first, s; null unless both are placed. */
  interval: number | null
  /** 1/|interval|, Hz; null also where the cursors coincide. */
  frequency: number | null
  series: SeriesReading[]
}

export function cursorReadings(
  series: readonly WaveformSeries[],
  sampleInterval: number,
  cursors: Cursors,
): CursorReadings {
  const interval = difference(cursors[0], cursors[1])
  return {
    interval,
    frequency: interval === null || interval === 0 ? null : 1 / Math.abs(interval),
    series: series.map(({ key, label, unit, values, sampleInterval: own }) => {
      const [first, second] = cursors.map((time) =>
        time === null ? null : valueAt(values, own ?? sampleInterval, time),
      )
      return {
        key,
        label,
        unit,
        first: first ?? null,
        second: second ?? null,
        difference: difference(first ?? null, second ?? null),
      }
    }),
  }
}

function difference(first: number | null, second: number | null): number | null {
  return first === null || second === null ? null : second - first
}
