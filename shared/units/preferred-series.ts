/**
 * Preferred number series for resistors and capacitors, IEC 60063:2015. The tables are the standard's: some values
 * differ from the rounded geometric rule (27 to 47 and 82 in E24, 920 in E192).
 */
export const seriesNames = ['E6', 'E12', 'E24', 'E48', 'E96', 'E192'] as const
export type SeriesName = (typeof seriesNames)[number]

/** Two significant digits, one decade. */
const e24 = [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91]

/** Three significant digits, one decade. */
// prettier-ignore
const e192 = [
  100, 101, 102, 104, 105, 106, 107, 109, 110, 111, 113, 114, 115, 117, 118, 120,
  121, 123, 124, 126, 127, 129, 130, 132, 133, 135, 137, 138, 140, 142, 143, 145,
  147, 149, 150, 152, 154, 156, 158, 160, 162, 164, 165, 167, 169, 172, 174, 176,
  178, 180, 182, 184, 187, 189, 191, 193, 196, 198, 200, 203, 205, 208, 210, 213,
  215, 218, 221, 223, 226, 229, 232, 234, 237, 240, 243, 246, 249, 252, 255, 258,
  261, 264, 267, 271, 274, 277, 280, 284, 287, 291, 294, 298, 301, 305, 309, 312,
  316, 320, 324, 328, 332, 336, 340, 344, 348, 352, 357, 361, 365, 370, 374, 379,
  383, 388, 392, 397, 402, 407, 412, 417, 422, 427, 432, 437, 442, 448, 453, 459,
  464, 470, 475, 481, 487, 493, 499, 505, 511, 517, 523, 530, 536, 542, 549, 556,
  562, 569, 576, 583, 590, 597, 604, 612, 619, 626, 634, 642, 649, 657, 665, 673,
  681, 690, 698, 706, 715, 723, 732, 741, 750, 759, 768, 777, 787, 796, 806, 816,
  825, 835, 845, 856, 866, 876, 887, 898, 909, 920, 931, 942, 953, 965, 976, 988,
]

const every = (table: readonly number[], step: number) => table.filter((_, index) => index % step === 0)

/** One decade of each series as significands 1 ≤ x < 10. A coarser series is every other value of the finer one. */
export const preferredSeries: Record<SeriesName, readonly number[]> = {
  E6: every(e24, 4).map((digits) => digits / 10),
  E12: every(e24, 2).map((digits) => digits / 10),
  E24: e24.map((digits) => digits / 10),
  E48: every(e192, 4).map((digits) => digits / 100),
  E96: every(e192, 2).map((digits) => digits / 100),
  E192: e192.map((digits) => digits / 100),
}

/** Relative difference below which a value counts as the preferred one. */
const coincidence = 1e-9

/** significand × 10^exponent as the nearest double, so that 4.7 and 3 give exactly 4700. */
const compose = (significand: number, exponent: number) => Number(`${significand}e${exponent}`)

/**
 * The next value of a series above (direction 1) or below (−1) a positive value; one that is not in the series goes to
 * its neighbour on that side.
 */
export function stepAlong(series: SeriesName, value: number, direction: 1 | -1): number {
  const decade = Math.floor(Math.log10(value))
  const around = [decade - 1, decade, decade + 1].flatMap((exponent) =>
    preferredSeries[series].map((significand) => compose(significand, exponent)),
  )
  const next =
    direction > 0
      ? around.find((candidate) => candidate > value * (1 + coincidence))
      : around.findLast((candidate) => candidate < value * (1 - coincidence))
  if (next === undefined) throw new RangeError(`no preferred value beside ${value}`)
  return next
}

/**
 * Moves a value by one unit of its `digits`-th significant digit: a fine step that keeps round numbers round
 * (20.2 k → 20.21 k with four digits). Zero moves by `zeroStep`.
 */
export function stepDigit(value: number, digits: number, direction: 1 | -1, zeroStep = 1e-3): number {
  if (value === 0) return direction * zeroStep
  const outward = direction * Math.sign(value) > 0
  const magnitude = Math.abs(value)
  const exponent = Math.floor(Math.log10(magnitude * (1 + coincidence))) - digits + 1
  const units = Math.round(magnitude / 10 ** exponent)
  // Below the decade's first value the unit is a tenth: 1.000 goes down to 0.9999.
  if (!outward && units === 10 ** (digits - 1))
    return Math.sign(value) * compose(units * 10 - 1, exponent - 1)
  return Math.sign(value) * compose(units + (outward ? 1 : -1), exponent)
}
