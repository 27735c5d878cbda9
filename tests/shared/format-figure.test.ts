import { describe, expect, it } from 'vitest'
import { formatFigure } from '#shared/units/format-figure.ts'

// Thin space U+2009 between number and unit, true minus sign U+2212: look.md, "Numbers".
describe('formatFigure', () => {
  it('shows each kind of figure as its definition says', () => {
    expect(formatFigure('thd', 0.013756)).toBe('1.376\u2009%')
    expect(formatFigure('frequency', 989.69)).toBe('989.7\u2009Hz')
    expect(formatFigure('gain', 3.0204)).toBe('3.02')
    expect(formatFigure('low', -7.5)).toBe('\u22127.5\u2009V')
  })

  it('shows a dash where there is no figure', () => {
    expect(formatFigure('thd', null)).toBe('–')
  })

  it('gives a rate no prefix', () => {
    expect(formatFigure('growthRate', 6184.45)).toBe('6184\u20091/s')
    expect(formatFigure('growthRate', -0.0125)).toBe('\u22120.0125\u20091/s')
  })

  it('passes options on', () => {
    expect(formatFigure('level', 0.25, { signed: true, digits: 2 })).toBe('+250\u2009mV')
  })
})
