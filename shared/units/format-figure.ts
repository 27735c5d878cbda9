import { figure, type FigureKey } from '#shared/figures.ts'
import { formatNumber, formatPercent, formatQuantity, type FormatOptions } from '#shared/units/format.ts'

/** One figure as it is shown: 1.376 %, 989.7 Hz, 3.02; a dash where it does not exist. */
export function formatFigure(key: FigureKey, value: number | null, options?: FormatOptions): string {
  if (value === null) return '–'
  const { shownAs, unit } = figure(key)
  if (shownAs === 'percent') return formatPercent(value, options)
  return shownAs === 'number' ? formatNumber(value, options) : formatQuantity(value, unit, options)
}
