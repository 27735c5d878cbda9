/** Samples of a motion on an even grid. */
import { deviceIndex, v1Index, v2Index, voIndex } from '#sim/circuit/plant.ts'
import type { Observer } from '#sim/modes/machine.ts'
import type { Stretch } from '#sim/modes/stretch.ts'

/** Slack, in samples, that lets a sample at the very end of a stretch belong to it despite rounding. */
const slack = 1e-9

export class Columns implements Observer {
  readonly vo: Float64Array
  readonly v1: Float64Array
  readonly v2: Float64Array
  readonly device: Float64Array | null
  /** Samples that are valid so far. */
  filled = 0

  /** `samples` values, `interval` seconds apart, the first at `start`. */
  constructor(
    samples: number,
    readonly start: number,
    readonly interval: number,
    hasDevice: boolean,
  ) {
    this.vo = new Float64Array(samples)
    this.v1 = new Float64Array(samples)
    this.v2 = new Float64Array(samples)
    this.device = hasDevice ? new Float64Array(samples) : null
  }

  advance(stretch: Stretch, a: number, b: number): void {
    const last = Math.min(this.vo.length - 1, Math.floor((b - this.start) / this.interval + slack))
    for (let n = this.filled; n <= last; n++) {
      const t = Math.min(b, Math.max(a, this.start + n * this.interval))
      this.vo[n] = stretch.component(voIndex, t)
      this.v1[n] = stretch.component(v1Index, t)
      this.v2[n] = stretch.component(v2Index, t)
      if (this.device) this.device[n] = stretch.component(deviceIndex, t)
    }
    this.filled = Math.max(this.filled, last + 1)
  }
}
