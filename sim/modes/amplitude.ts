/**
 * How large each state is just now: its greatest modulus over the present window of time and the one before. The
 * integrator's error is weighed against this instead of the momentary value, which passes zero twice a period, and
 * follows an oscillation that grows from microvolts to volts.
 */
export class Amplitude {
  private windowEnd = 0
  private readonly present: number[]
  private readonly previous: number[]

  /**
   * @param least sizes below which a state does not matter, in its unit
   * @param window s
   */
  constructor(
    private readonly least: readonly number[],
    private readonly window: number,
  ) {
    this.present = [...least]
    this.previous = [...least]
  }

  /** Takes in the state `y` at `t` s; times come in order. */
  note(t: number, y: readonly number[]): void {
    if (t > this.windowEnd) {
      this.windowEnd = t + this.window
      for (let i = 0; i < y.length; i++) {
        this.previous[i] = this.present[i]!
        this.present[i] = this.least[i]!
      }
    }
    for (let i = 0; i < y.length; i++) this.present[i] = Math.max(this.present[i]!, Math.abs(y[i]!))
  }

  /** Present size of one state, in its unit; never below its least. */
  size(index: number): number {
    return Math.max(this.present[index]!, this.previous[index]!)
  }
}
