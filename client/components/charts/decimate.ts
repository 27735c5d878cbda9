/**
 * Thins a record to what a screen can show. In each column of pixels the least and the greatest sample are kept, in
 * the order in which they occur, so that no peak is lost whatever the zoom.
 */

/** Range of indices, both ends included; empty when `last < first`. */
export interface IndexRange {
  first: number
  last: number
}

/** Samples of a uniform grid that draw the span [from, to] s: those inside and one neighbour on either side. */
export function gridRange(length: number, sampleInterval: number, from: number, to: number): IndexRange {
  return {
    first: Math.max(0, Math.floor(from / sampleInterval)),
    last: Math.min(length - 1, Math.ceil(to / sampleInterval)),
  }
}

/** Samples of a uniform grid within [from, to] s; one on an edge belongs to it in spite of rounding. */
export function samplesWithin(length: number, sampleInterval: number, from: number, to: number): IndexRange {
  return {
    first: Math.max(0, Math.ceil(from / sampleInterval - 1e-6)),
    last: Math.min(length - 1, Math.floor(to / sampleInterval + 1e-6)),
  }
}

/** Index of the first entry of the ascending `times` that is not before `time`; its length when all are. */
function firstNotBefore(times: Float64Array, time: number): number {
  let low = 0
  let high = times.length
  while (low < high) {
    const middle = (low + high) >>> 1
    if (times[middle]! < time) low = middle + 1
    else high = middle
  }
  return low
}

/** The same for ascending times that are not evenly spaced. */
export function timesRange(times: Float64Array, from: number, to: number): IndexRange {
  return {
    first: Math.max(0, firstNotBefore(times, from) - 1),
    last: Math.min(times.length - 1, firstNotBefore(times, to)),
  }
}

/**
 * Indices to draw out of `range` for a plot of `columns` pixels, ascending: all of them while they are at most two a
 * column, otherwise at most two (least and greatest) of each bucket. Buckets begin at multiples of their own size,
 * so that panning moves the drawing without changing its shape.
 */
export function keptIndices(values: Float64Array, { first, last }: IndexRange, columns: number): Uint32Array {
  const count = Math.max(0, last - first + 1)
  if (count <= 2 * columns) return Uint32Array.from({ length: count }, (_, i) => first + i)
  const size = Math.ceil(count / columns)
  const kept = new Uint32Array(2 * (Math.ceil(count / size) + 1))
  let length = 0
  for (let start = first; start <= last;) {
    const end = Math.min(last + 1, (Math.floor(start / size) + 1) * size)
    let least = start
    let greatest = start
    let low = values[start]!
    let high = low
    for (let i = start + 1; i < end; i++) {
      const value = values[i]!
      if (value < low) {
        low = value
        least = i
      } else if (value > high) {
        high = value
        greatest = i
      }
    }
    kept[length++] = Math.min(least, greatest)
    if (least !== greatest) kept[length++] = Math.max(least, greatest)
    start = end
  }
  return kept.subarray(0, length)
}

/** A line as a plot draws it: times in s and values, of equal length. */
export interface DrawnLine {
  time: Float64Array
  value: Float64Array
}

/** The line that shows [from, to] of a uniformly sampled record in `columns` pixels. */
export function drawnGrid(
  values: Float64Array,
  sampleInterval: number,
  from: number,
  to: number,
  columns: number,
): DrawnLine {
  const kept = keptIndices(values, gridRange(values.length, sampleInterval, from, to), columns)
  return {
    time: Float64Array.from(kept, (i) => i * sampleInterval),
    value: Float64Array.from(kept, (i) => values[i]!),
  }
}

/** The line that shows [from, to] of points at uneven times in `columns` pixels. */
export function drawnPoints(points: DrawnLine, from: number, to: number, columns: number): DrawnLine {
  const kept = keptIndices(points.value, timesRange(points.time, from, to), columns)
  return {
    time: Float64Array.from(kept, (i) => points.time[i]!),
    value: Float64Array.from(kept, (i) => points.value[i]!),
  }
}
