import { describe, expect, it } from 'vitest'
import { formatInput, formatNumber, formatPercent, formatQuantity } from '#shared/units/format.ts'

/** Spaces between number and unit, true minus and prefixes: SI brochure, 9th edition, 5.4.3 and table 7. */
describe('formatQuantity', () => {
  it('chooses the prefix after rounding', () => {
    expect(formatQuantity(989.6907, 'Hz')).toBe('989.7\u2009Hz')
    expect(formatQuantity(999.96, 'Hz')).toBe('1\u2009kHz')
    expect(formatQuantity(2200, 'Ω')).toBe('2.2\u2009kΩ')
    expect(formatQuantity(16e-9, 'F')).toBe('16\u2009nF')
    expect(formatQuantity(0, 'V')).toBe('0\u2009V')
  })
  it('writes a true minus sign', () => expect(formatQuantity(-1.5e-3, 'V')).toBe('\u22121.5\u2009mV'))
  it('gives slew rates in volts a microsecond, as data sheets do (common practice, no source)', () => {
    expect(formatQuantity(5e5, 'V/s')).toBe('0.5\u2009V/µs')
    expect(formatQuantity(1e8, 'V/s')).toBe('100\u2009V/µs')
    expect(formatQuantity(40, 'V/s')).toBe('40\u2009V/s')
  })
  it('has no number for what is not a number', () => expect(formatQuantity(Number.NaN, 'V')).toContain('–'))
})

describe('formatPercent and formatNumber', () => {
  it('scale and sign', () => {
    expect(formatPercent(0.01375)).toBe('1.375\u2009%')
    expect(formatPercent(0.0066, { digits: 2, signed: true })).toBe('+0.66\u2009%')
    expect(formatNumber(-3.02)).toBe('\u22123.02')
  })
})

describe('formatInput', () => {
  it('writes what the fields accept', () => {
    expect(formatInput(4700)).toBe('4.7k')
    expect(formatInput(1.6e-8)).toBe('16n')
    expect(formatInput(2.2e-6)).toBe('2.2u')
    expect(formatInput(-1e-3)).toBe('-1m')
    expect(formatInput(1e6)).toBe('1M')
  })
})
