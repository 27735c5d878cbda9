/** The slow-motion playhead: where it is, what limits the output there, and how it moves. Seconds from power-on. */
import type { RunModeSpan } from '#shared/schemas/run.ts'

/** Index of the last span that starts at or before `time`; −1 before the first. Spans are in order of time. */
function spanIndex(modes: readonly RunModeSpan[], time: number): number {
  let low = 0
  let high = modes.length
  while (low < high) {
    const middle = (low + high) >>> 1
    if (modes[middle]!.start <= time) low = middle + 1
    else high = middle
  }
  return low - 1
}

/** What governs the output at `time`; the loop where no span says otherwise. */
export function modeAt(modes: readonly RunModeSpan[], time: number): RunModeSpan['mode'] {
  const span = modes[spanIndex(modes, time)]
  return span && (time < span.end || span === modes.at(-1)) ? span.mode : 'linear'
}

/** When the mode next changes after `time`, or null when it does not change again. */
export function nextChange(modes: readonly RunModeSpan[], time: number): number | null {
  return modes[spanIndex(modes, time) + 1]?.start ?? null
}

/** When the mode last changed before `time`, or null when it had not; power-on itself counts as a change. */
export function previousChange(modes: readonly RunModeSpan[], time: number): number | null {
  let index = spanIndex(modes, time)
  if (modes[index]?.start === time) index--
  return modes[index]?.start ?? null
}

/**
 * The playhead after `elapsed` seconds on the wall at `speed` seconds of record per second, stopped at `end`.
 */
export function advance(time: number, elapsed: number, speed: number, end: number): number {
  return Math.min(end, time + elapsed * speed)
}

/**
 * Speeds to choose from, seconds of record per second, in decades: from a tenth of a period per second (every bend can
 * be followed) up to the whole record in a few seconds.
 * @param period of the oscillation, s; null when there is none, then a fiftieth of the record stands for it
 */
export function speedChoices(period: number | null, duration: number): number[] {
  const shortest = Math.min(period ?? duration / 50, duration)
  const least = Math.floor(Math.log10(shortest / 10) + 1e-9)
  const greatest = Math.max(least + 1, Math.floor(Math.log10(duration / 4) + 1e-9))
  return Array.from({ length: greatest - least + 1 }, (_, index) => Number(`1e${least + index}`))
}

/** The speed that shows about one period a second. */
export function usualSpeed(choices: readonly number[], period: number | null): number {
  const wanted = period ?? choices[1] ?? choices[0]!
  const off = (speed: number) => Math.abs(Math.log(speed / wanted))
  return choices.reduce((best, speed) => (off(speed) < off(best) ? speed : best))
}

/** The part of the view that follows the playhead: `view`, turned on like a page when the playhead has left it. */
export function follow(view: readonly [number, number], time: number, end: number): [number, number] {
  const [from, to] = view
  if (time >= from && time <= to) return [from, to]
  const width = to - from
  const start = Math.max(0, Math.min(time - width / 16, end - width))
  return [start, start + width]
}
