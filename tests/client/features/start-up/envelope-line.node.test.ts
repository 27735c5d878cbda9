import { describe, expect, it } from 'vitest'
import { envelopeLine } from '#client/features/start-up/lib/envelope-line.ts'

const line = (values: number[]) => {
  const times = values.map((_, index) => index)
  const { time, value } = envelopeLine({ time: Float64Array.from(times), value: Float64Array.from(values) })
  return { times: [...time], values: [...value] }
}

describe('envelopeLine', () => {
  it('keeps the higher maximum of each cycle of an output that swings about an offset', () => {
    // |1 + 4·2^(−k/2)·(±1)| for k = 0, 1, 2 …: 5, 1.83, 3, 0.41, 2.
    expect(line([5, 1.83, 3, 0.41, 2])).toEqual({ times: [0, 2, 4], values: [5, 3, 2] })
  })

  it('leaves growth, decay and plateaus as they are', () => {
    const values = [1, 2, 4, 4, 4, 3, 2]
    expect(line(values).values).toEqual(values)
  })

  it('takes an empty envelope', () => {
    expect(line([])).toEqual({ times: [], values: [] })
  })
})
