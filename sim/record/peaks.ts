/**
 * Turning points of the output: where the amplifier's demand changes sign in the linear mode, and where a rail begins to
 * hold. The departure from a rail is not one, though the demand passes zero there.
 */
import { voIndex, type Plant } from '#sim/circuit/plant.ts'
import { bracketedRoot } from '#sim/linalg/root.ts'
import type { Observer, Position } from '#sim/modes/machine.ts'
import type { Stretch } from '#sim/modes/stretch.ts'

interface Peak {
  /** s. */
  time: number
  /** Output, V. */
  value: number
  /** Whether the output turns down (or is stopped from rising) there. */
  upper: boolean
}

/** Demand below this share of the largest seen is rounding at a rail's exit. */
const rounding = 1e-9

export class Peaks implements Observer {
  private demand = 0
  private largest = 0

  constructor(
    private readonly plant: Plant,
    private readonly found: (peak: Peak) => void,
  ) {}

  enter({ t, y, mode }: Readonly<Position>): void {
    const demand = this.plant.demand(y)
    this.largest = Math.max(this.largest, Math.abs(demand))
    this.demand = Math.abs(demand) > rounding * this.largest ? demand : 0
    if (mode === 'heldHigh' || mode === 'heldLow')
      this.found({ time: t, value: y[voIndex]!, upper: mode === 'heldHigh' })
  }

  advance(stretch: Stretch, a: number, b: number): void {
    if (stretch.mode !== 'linear') return
    const before = this.demand
    this.demand = this.plant.demand(stretch.at(b))
    const turnsDown = before > 0 && this.demand <= 0
    const turnsUp = before < 0 && this.demand >= 0
    if (!turnsDown && !turnsUp) return
    const demandAt = (t: number) => this.plant.demand(stretch.at(t))
    if (demandAt(a) > 0 === this.demand > 0) return
    const time = bracketedRoot(demandAt, a, b)
    this.found({ time, value: stretch.component(voIndex, time), upper: turnsDown })
  }
}
