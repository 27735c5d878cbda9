import { z } from 'zod'
import { formatQuantity } from '#shared/units/format.ts'

/**
 * A finite number in SI units between two bounds, refused with a sentence that names the quantity.
 * @param name the quantity as the user knows it, e.g. "Series R"
 * @param unit SI unit symbol used in the sentence
 */
export function quantity(name: string, unit: string, [least, greatest]: readonly [number, number]) {
  return z
    .number({
      error: (issue) =>
        issue.input === undefined || issue.input === null
          ? `${name} is missing.`
          : `${name} must be a finite number.`,
    })
    .min(least, {
      error: (issue) =>
        least > 0 && typeof issue.input === 'number' && issue.input <= 0
          ? `${name} must be greater than zero.`
          : `${name} must be at least ${formatQuantity(least, unit)}.`,
    })
    .max(greatest, { error: `${name} must be at most ${formatQuantity(greatest, unit)}.` })
}
