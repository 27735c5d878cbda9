/** Texts along an axis: one SI prefix for all of them and no more digits than tell neighbours apart. */
import { minusSign, prefixExponent, quantityParts, thinSpace } from '#shared/units/format.ts'

/** `ticks` (ascending, evenly spaced, in `unit`) as texts: `20 ms`, `−4.5 V`. */
export function axisLabels(ticks: readonly number[], unit: string): string[] {
  const largest = Math.max(0, ...ticks.map(Math.abs))
  if (largest === 0) return ticks.map(() => `0${thinSpace}${unit}`)
  // Rounded as `quantityParts` rounds, so that number and prefix belong together.
  const prefixed = quantityParts(largest, unit)
  const scale = 10 ** prefixExponent(Number(largest.toPrecision(4)))
  const step = Math.abs((ticks[1] ?? largest) - (ticks[0] ?? 0)) / scale
  const decimals = Math.min(12, Math.max(0, fewestDecimals(step)))
  return ticks.map((tick) => {
    const text = (tick / scale).toFixed(decimals)
    const signed = text.startsWith('-') ? minusSign + text.slice(1) : text
    return `${Number(text) === 0 ? '0' : signed}${thinSpace}${prefixed.unit}`.trimEnd()
  })
}

/** Decimals that write `step` without rounding it by more than a thousandth. */
function fewestDecimals(step: number): number {
  let decimals = 0
  while (decimals < 12 && Math.abs(Number(step.toFixed(decimals)) - step) > step * 1e-3) decimals++
  return decimals
}
