/** Geometry of a spectrum on a logarithmic level axis, in decibels or per cent of the fundamental. */

/** How the levels are labelled: the positions are the same, 20 dB being one decade. */
export type LevelScale = 'decibel' | 'percent'

/** Lowest and highest axis that a spectrum may get, dB below the fundamental. */
const shallowest = -60
const deepest = -160

/** Level of `ratio` to the fundamental in decibels: 20 log10. */
export const decibels = (ratio: number) => 20 * Math.log10(ratio)

/** Bottom of the axis, dB: the next whole decade below the weakest of the ratios that counts. */
export function axisFloor(ratios: readonly number[]): number {
  const weakest = Math.min(...ratios.filter((ratio) => ratio > 0).map(decibels))
  const decade = Math.floor(weakest / 20 - 0.25) * 20
  return Math.max(deepest, Math.min(shallowest, Number.isFinite(decade) ? decade : shallowest))
}

/** Height of a stem as a share of the plot; 0 for what lies below the axis. */
export function stemHeight(ratio: number, floor: number): number {
  return ratio > 0 ? Math.max(0, 1 - decibels(ratio) / floor) : 0
}

/** Levels that get a grid line, dB from 0 down to the floor, one decade apart (two where they would crowd). */
export function levelTicks(floor: number): number[] {
  const step = floor < -100 ? 40 : 20
  return Array.from({ length: Math.floor(-floor / step) + 1 }, (_, i) => -i * step)
}
