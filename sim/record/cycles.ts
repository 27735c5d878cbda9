/**
 * Cycles of a motion, cut at the rising zeros of `v1`, and the envelope. The rising zero is always a valid cut: the
 * series C blocks direct current, so the mean of `v1` is zero.
 */
import { v1Index, type Plant } from '#sim/circuit/plant.ts'
import { bracketedRoot } from '#sim/linalg/root.ts'
import type { Observer, Position } from '#sim/modes/machine.ts'
import type { Stretch } from '#sim/modes/stretch.ts'
import { Peaks } from '#sim/record/peaks.ts'

export interface Cycle {
  /** Rising zeros that bound it, s. */
  start: number
  end: number
  /** Highest and lowest turning point of the output in it, V. */
  high: number
  low: number
}

export class Cycles implements Observer {
  readonly list: Cycle[] = []
  /** Maxima of |output|, both polarities, in order. */
  readonly peakTimes: number[] = []
  readonly peakValues: number[] = []
  private readonly peaks: Peaks
  private high = -Infinity
  private low = Infinity
  private v1 = 0

  /**
   * @param crossed hears of every rising zero; `true` ends the motion there
   * @param begun the rising zero at which the motion begins, where it does
   */
  constructor(
    plant: Plant,
    private readonly crossed?: (time: number) => boolean,
    private begun: number | null = null,
  ) {
    this.peaks = new Peaks(plant, ({ time, value, upper }) => {
      this.high = Math.max(this.high, value)
      this.low = Math.min(this.low, value)
      if (upper !== value > 0) return
      this.peakTimes.push(time)
      this.peakValues.push(Math.abs(value))
    })
  }

  enter(position: Readonly<Position>): void {
    this.v1 = position.y[v1Index]!
    this.peaks.enter(position)
  }

  advance(stretch: Stretch, a: number, b: number): number | void {
    const before = this.v1
    this.v1 = stretch.component(v1Index, b)
    if (before >= 0 || this.v1 < 0) return this.peaks.advance(stretch, a, b)
    const v1At = (t: number) => stretch.component(v1Index, t)
    const time = v1At(a) < 0 ? bracketedRoot(v1At, a, b) : a
    this.peaks.advance(stretch, a, time)
    this.cut(time)
    if (this.crossed?.(time)) return time
    this.peaks.advance(stretch, time, b)
  }

  private cut(time: number): void {
    if (this.begun !== null && this.high >= this.low)
      this.list.push({ start: this.begun, end: time, high: this.high, low: this.low })
    this.begun = time
    this.high = -Infinity
    this.low = Infinity
  }
}
