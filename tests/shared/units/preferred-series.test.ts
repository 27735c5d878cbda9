import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { preferredSeries, seriesNames, stepAlong, stepDigit } from '#shared/units/preferred-series.ts'

/** round(10^(i/n)) with two or three significant digits: the rule that the tables follow but for exceptions. */
const geometric = (n: number, digits: number) =>
  Array.from({ length: n }, (_, i) => Number((10 ** (i / n)).toFixed(digits - 1)))

const exceptions = (table: readonly number[], digits: number) =>
  table.filter((significand, index) => significand !== geometric(table.length, digits)[index])

describe('preferredSeries, IEC 60063:2015', () => {
  it.each(seriesNames)('%s has as many values in a decade as its name says, ascending from 1', (name) => {
    const table = preferredSeries[name]
    expect(table).toHaveLength(Number(name.slice(1)))
    expect(table[0]).toBe(1)
    expect([...table].sort((a, b) => a - b)).toEqual(table)
  })

  it('E6 and E12 are as printed in every catalogue', () => {
    expect(preferredSeries.E6).toEqual([1, 1.5, 2.2, 3.3, 4.7, 6.8])
    expect(preferredSeries.E12).toEqual([1, 1.2, 1.5, 1.8, 2.2, 2.7, 3.3, 3.9, 4.7, 5.6, 6.8, 8.2])
  })

  it('differs from the geometric rule exactly where the standard does (from memory)', () => {
    expect(exceptions(preferredSeries.E24, 2)).toEqual([2.7, 3, 3.3, 3.6, 3.9, 4.3, 4.7, 8.2])
    expect(exceptions(preferredSeries.E48, 3)).toEqual([])
    expect(exceptions(preferredSeries.E96, 3)).toEqual([])
    expect(exceptions(preferredSeries.E192, 3)).toEqual([9.2])
  })
})

describe('stepAlong', () => {
  it('goes to the neighbours, across decades too', () => {
    expect(stepAlong('E24', 10e3, 1)).toBe(11e3)
    expect(stepAlong('E24', 10e3, -1)).toBe(9.1e3)
    expect(stepAlong('E6', 6.8e-9, 1)).toBe(10e-9)
    expect(stepAlong('E96', 976, 1)).toBe(1000)
  })

  it('takes a value outside the series to the neighbour on that side', () => {
    expect(stepAlong('E12', 20_200, 1)).toBe(22_000)
    expect(stepAlong('E12', 20_200, -1)).toBe(18_000)
  })

  it('up and down again returns', () =>
    fc.assert(
      fc.property(
        fc.constantFrom(...seriesNames),
        fc.nat(500),
        fc.integer({ min: -12, max: 8 }),
        (name, i, exponent) => {
          const table = preferredSeries[name]
          const value = Number(`${table[i % table.length]}e${exponent}`)
          expect(stepAlong(name, stepAlong(name, value, 1), -1)).toBe(value)
        },
      ),
    ))
})

describe('stepDigit', () => {
  it('moves one unit of the wanted digit and stays round', () => {
    expect(stepDigit(20_200, 4, 1)).toBe(20_210)
    expect(stepDigit(20_200, 4, -1)).toBe(20_190)
    expect(stepDigit(1e-8, 4, -1)).toBe(9.999e-9)
    expect(stepDigit(9_999, 4, 1)).toBe(10_000)
  })
  it('goes through zero by the stated step and follows the sign', () => {
    expect(stepDigit(0, 2, 1, 0.1)).toBe(0.1)
    expect(stepDigit(-1e-3, 2, -1)).toBe(-1.1e-3)
    expect(stepDigit(-1e-3, 2, 1)).toBe(-9.9e-4)
  })
})
