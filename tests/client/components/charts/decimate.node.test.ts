import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  drawnGrid,
  drawnPoints,
  gridRange,
  keptIndices,
  timesRange,
} from '#client/components/charts/decimate.ts'

const record = fc
  .array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: 1, maxLength: 600 })
  .map((values) => Float64Array.from(values))

/** Least and greatest value over the indices from `first` to `last`, by looking at each. */
function extremes(values: Float64Array, first: number, last: number): [number, number] {
  let [low, high] = [Infinity, -Infinity]
  for (let i = first; i <= last; i++) {
    low = Math.min(low, values[i]!)
    high = Math.max(high, values[i]!)
  }
  return [low, high]
}

describe('keptIndices', () => {
  it('keeps least and greatest of every bucket, against brute force', () => {
    fc.assert(
      fc.property(
        record,
        fc.integer({ min: 1, max: 40 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (values, columns, cut) => {
          const first = Math.floor(cut * (values.length - 1))
          const last = values.length - 1
          const kept = [...keptIndices(values, { first, last }, columns)]
          const count = last - first + 1
          if (count <= 2 * columns) {
            expect(kept).toEqual(Array.from({ length: count }, (_, i) => first + i))
            return
          }
          const size = Math.ceil(count / columns)
          for (let bucket = Math.floor(first / size); bucket * size <= last; bucket++) {
            const from = Math.max(first, bucket * size)
            const to = Math.min(last, bucket * size + size - 1)
            const inside = kept.filter((i) => i >= from && i <= to)
            expect(inside.length).toBeGreaterThanOrEqual(1)
            expect(inside.length).toBeLessThanOrEqual(2)
            const [low, high] = extremes(values, from, to)
            expect(Math.min(...inside.map((i) => values[i]!))).toBe(low)
            expect(Math.max(...inside.map((i) => values[i]!))).toBe(high)
          }
        },
      ),
    )
  })

  it('keeps indices ascending and at most two a column and one bucket more', () => {
    fc.assert(
      fc.property(record, fc.integer({ min: 1, max: 40 }), (values, columns) => {
        const kept = keptIndices(values, { first: 0, last: values.length - 1 }, columns)
        expect(kept.length).toBeLessThanOrEqual(2 * (columns + 1))
        expect(kept.every((index, i) => i === 0 || index > kept[i - 1]!)).toBe(true)
      }),
    )
  })

  it('moves with the view without changing shape: shared buckets keep the same samples', () => {
    const values = Float64Array.from({ length: 10_000 }, (_, i) => Math.sin(i * 0.7) * Math.cos(i * 0.013))
    const inBoth = (kept: Uint32Array) => [...kept].filter((i) => i >= 3_000 && i < 6_000)
    const here = keptIndices(values, { first: 1_000, last: 6_999 }, 100)
    const there = keptIndices(values, { first: 1_017, last: 7_016 }, 100)
    expect(inBoth(here)).toEqual(inBoth(there))
  })

  it('keeps nothing of an empty range', () => {
    expect(keptIndices(new Float64Array(), { first: 0, last: -1 }, 100)).toHaveLength(0)
  })
})

describe('ranges', () => {
  it('holds the samples inside and one neighbour on either side', () => {
    expect(gridRange(101, 0.01, 0.205, 0.395)).toEqual({ first: 20, last: 40 })
    expect(timesRange(Float64Array.of(0, 1, 2, 4, 8), 1.5, 3)).toEqual({ first: 1, last: 3 })
  })

  it('stays within the record', () => {
    expect(gridRange(11, 0.1, -1, 5)).toEqual({ first: 0, last: 10 })
    expect(timesRange(Float64Array.of(1, 2), 0, 9)).toEqual({ first: 0, last: 1 })
  })
})

describe('drawn lines', () => {
  it('gives times in seconds beside the values', () => {
    const line = drawnGrid(Float64Array.of(0, 1, 4, 9), 0.5, 0.5, 1, 100)
    expect([...line.time]).toEqual([0.5, 1])
    expect([...line.value]).toEqual([1, 4])
  })

  it('loses no peak of a million samples', () => {
    const values = Float64Array.from({ length: 1_000_001 }, (_, i) => Math.sin(i * 0.01))
    values[654_321] = 7
    const line = drawnGrid(values, 1e-6, 0, 1, 1_200)
    expect(Math.max(...line.value)).toBe(7)
    expect(line.time[line.value.indexOf(7)]).toBeCloseTo(0.654321, 9)
    expect(line.value.length).toBeLessThanOrEqual(2_402)
  })

  it('thins uneven points the same way', () => {
    const time = Float64Array.from({ length: 5_000 }, (_, i) => i * i * 1e-6)
    const value = Float64Array.from(time, (_, i) => (i === 1_234 ? 5 : Math.cos(i)))
    const line = drawnPoints({ time, value }, 0, 25, 50)
    expect(Math.max(...line.value)).toBe(5)
    expect(line.time[line.value.indexOf(5)]).toBe(time[1_234])
  })
})
