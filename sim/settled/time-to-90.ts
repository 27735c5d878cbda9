/** Share of the settled level that counts as started. */
const startedShare = 0.9

/**
 * Time at which successive maxima of |output|, joined linearly, first reach 90 % of `level`, s; null if they never do.
 * @param times of the maxima, s, ascending
 * @param values of the maxima, V
 */
export function timeTo90(times: readonly number[], values: readonly number[], level: number): number | null {
  const target = startedShare * level
  const index = values.findIndex((value) => value >= target)
  if (index < 0) return null
  const time = times[index]!
  if (index === 0) return time
  const before = values[index - 1]!
  const timeBefore = times[index - 1]!
  return timeBefore + ((target - before) / (values[index]! - before)) * (time - timeBefore)
}
