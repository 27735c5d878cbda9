/** Room around a plot's area in CSS pixels. Fixed, so that overlays and the overview strip line up with it. */
export interface PlotFrame {
  left: number
  right: number
  top: number
  bottom: number
}

/** Room for one value axis on the left, and for a second one on the right where two units are shown. */
export function plotFrame(units: readonly string[]): PlotFrame {
  return { left: 60, right: units.length > 1 ? 60 : 26, top: 14, bottom: 30 }
}

/** The distinct units of some series, in order of appearance. */
export function unitsOf(series: readonly { unit: string }[]): string[] {
  return [...new Set(series.map((one) => one.unit))]
}

/** Least and greatest value over the drawn lines, widened by a twelfth; a flat line gets room of its own. */
export function valueRange(lines: readonly Float64Array[]): [number, number] {
  let low = Infinity
  let high = -Infinity
  for (const line of lines)
    for (const value of line) {
      if (value < low) low = value
      if (value > high) high = value
    }
  if (low > high) return [-1, 1]
  const room = (high - low) / 12 || Math.abs(high) / 12 || 1
  return [low - room, high + room]
}
