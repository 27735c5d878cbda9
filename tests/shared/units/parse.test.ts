import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { formatInput } from '#shared/units/format.ts'
import { parseQuantity } from '#shared/units/parse.ts'

const value = (text: string, unit = '') => {
  const parsed = parseQuantity(text, unit)
  if (!parsed.ok) throw new Error(`${text}: ${parsed.sentence}`)
  return parsed.value
}
const sentence = (text: string, unit = '') => {
  const parsed = parseQuantity(text, unit)
  return parsed.ok ? `read as ${parsed.value}` : parsed.sentence
}

describe('parseQuantity, letter and digit code of IEC 60062', () => {
  it.each([
    ['R47', 0.47],
    ['4R7', 4.7],
    ['47R', 47],
    ['470R', 470],
    ['4K7', 4700],
    ['4k7', 4700],
    ['47K', 47_000],
    ['470k', 470_000],
    ['1M', 1e6],
    ['3M32', 3.32e6],
    ['590R', 590],
    ['5K9', 5900],
  ])('reads the resistance %s', (text, ohms) => expect(value(text, 'Ω')).toBe(ohms))

  it.each([
    ['p33', 0.33e-12],
    ['3p32', 3.32e-12],
    ['4n7', 4.7e-9],
    ['n47', 0.47e-9],
    ['4µ7', 4.7e-6],
    ['100n', 100e-9],
    ['0F1', 0.1],
  ])('reads the capacitance %s', (text, farads) => expect(value(text, 'F')).toBe(farads))

  it('refuses an R in a capacitance', () => expect(sentence('4R7', 'F')).toContain('not a number'))
})

describe('parseQuantity, SI prefixes (SI brochure, 9th edition, table 7)', () => {
  it.each([
    ['4.7k', 'Ω', 4700],
    ['0.1u', 'F', 1e-7],
    ['0.1µ', 'F', 1e-7],
    ['0.1μF', 'F', 1e-7],
    ['2.2 kΩ', 'Ω', 2200],
    ['2.2 kohm', 'Ω', 2200],
    ['1 MHz', 'Hz', 1e6],
    ['1m', 's', 1e-3],
    ['60 ms', 's', 0.06],
    ['1M', 's', 1e6],
    ['1e-9', 'F', 1e-9],
    ['1.5E3', '', 1500],
    ['−1,5 mV', 'V', -1.5e-3],
    ['+9', 'V', 9],
    ['3V3', 'V', 3.3],
    ['1 aF', 'F', 1e-18],
    ['1 TΩ', 'Ω', 1e12],
    ['0.5 V/µs', 'V/s', 5e5],
    ['500 kV/s', 'V/s', 5e5],
    // Data sheets state slew rates in V/µs (common practice, no source).
    ['13', 'V/s', 1.3e7],
    ['0,5', 'V/s', 5e5],
    ['40 V/s', 'V/s', 40],
    ['300 K', 'K', 300],
    ['80 µW/K', 'W/K', 8e-5],
    ['.5', '', 0.5],
    ['5.', '', 5],
    ['-0', 'V', 0],
  ])('reads %s in %s', (text, unit, expected) => expect(value(text, unit)).toBe(expected))

  it('reads per cent as a ratio', () => {
    expect(value('1.5 %', '%')).toBe(0.015)
    expect(value('−2', '%')).toBe(-0.02)
  })
})

describe('parseQuantity, what it refuses', () => {
  it('names what was typed', () =>
    expect(sentence('4q7', 'Ω')).toBe('“4q7” is not a number with a prefix such as 4k7, 100n or 0.1u.'))
  it('asks for a value where there is none', () => expect(sentence('  ', 'Ω')).toContain('Nothing is typed'))
  it('does not take infinity', () => {
    expect(sentence('Infinity', 'Ω')).toBe('“Infinity” is not a finite number.')
    expect(sentence('1e999', 'Ω')).toBe('“1e999” is too large to be a number.')
  })
  it('does not guess between a decimal comma and a thousands separator', () => {
    expect(sentence('4,700', 'Ω')).toBe('“4,700” can be read in two ways: write 4.700 or 4700.')
    expect(value('0,100', 'Ω')).toBe(0.1)
    expect(value('4,7k', 'Ω')).toBe(4700)
    expect(sentence('1,234.5', 'Ω')).toContain('more than one decimal sign')
  })
  it('helps with mistaken prefixes', () => {
    expect(sentence('100N', 'F')).toBe('“100N”: N is no prefix, write n.')
    expect(sentence('1meg', 'Ω')).toContain('write M for mega')
  })
  it.each([
    ['4k7k', 'Ω'],
    ['4k', '%'],
    ['10V', 'Ω'],
    ['1.2.3', ''],
    ['k', 'Ω'],
    ['--3', 'V'],
    ['0x10', ''],
  ])('refuses %s in %s', (text, unit) => expect(parseQuantity(text, unit).ok).toBe(false))
})

describe('parseQuantity after formatInput', () => {
  it('gives the value back to the digits shown, at any magnitude', () =>
    fc.assert(
      fc.property(
        fc.double({ min: 1e-18, max: 9e14, noNaN: true }),
        fc.constantFrom('Ω', 'F', 'V', 'Hz', ''),
        fc.boolean(),
        (magnitude, unit, negative) => {
          const original = negative ? -magnitude : magnitude
          expect(Math.abs(value(formatInput(original), unit) / original - 1)).toBeLessThan(5.1e-6)
        },
      ),
    ))
})
