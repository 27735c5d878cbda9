import { figure, type FigureKey } from '#shared/figures.ts'
import { formatFigure } from '#shared/units/format-figure.ts'
import { formatPercent, minusSign, thinSpace, type FormatOptions } from '#shared/units/format.ts'

const superscripts: Record<string, string> = {
  '-': '⁻',
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
}
/** Below this a number without prefix is easier read as a power of ten. */
const smallest = 1e-3

function powerOfTen(value: number): string {
  const [mantissa, exponent] = value.toExponential(1).split('e') as [string, string]
  const raised = [...exponent.replace('+', '')].map((digit) => superscripts[digit]).join('')
  return `${mantissa.replace('-', minusSign)} × 10${raised}`
}

/** A ratio in per cent, two digits unless told, as a power of ten where it is tiny. */
export function formatShare(ratio: number | null, options: FormatOptions = {}): string {
  if (ratio === null) return '–'
  if (ratio === 0) return '0'
  const { digits = 2, signed = false } = options
  if (Math.abs(ratio * 100) >= smallest) return formatPercent(ratio, { digits, signed })
  return `${signed && ratio > 0 ? '+' : ''}${powerOfTen(ratio * 100)}${thinSpace}%`
}

/**
 * A small difference or tolerance of a figure, in the figure's own way of being shown: two digits; what has no SI
 * prefix to shrink into becomes a power of ten.
 */
export function formatDifference(
  key: FigureKey,
  value: number | null,
  { signed = false }: Pick<FormatOptions, 'signed'> = {},
): string {
  if (value === null) return '–'
  if (value === 0) return '0'
  const { shownAs, unit } = figure(key)
  if (shownAs === 'percent') return formatShare(value, { signed })
  const prefixed = shownAs === 'quantity' && !unit.startsWith('1/')
  if (prefixed || Math.abs(value) >= smallest) return formatFigure(key, value, { digits: 2, signed })
  return `${signed && value > 0 ? '+' : ''}${powerOfTen(value)}${unit && thinSpace + unit}`
}
