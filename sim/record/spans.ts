/** The spans of modes along a motion. */
import type { Observer, Position } from '#sim/modes/machine.ts'
import type { Stretch } from '#sim/modes/stretch.ts'
import type { Mode, ModeSpan } from '#sim/types.ts'

export class Spans implements Observer {
  readonly list: ModeSpan[] = []
  private open: ModeSpan | null = null

  enter({ t, mode }: Readonly<Position>): void {
    if (this.open?.mode === mode) return
    this.close()
    this.open = { mode, start: t, end: t }
  }

  advance(_stretch: Stretch, _a: number, b: number): void {
    if (this.open) this.open.end = b
  }

  /** Ends the span under way; spans of no length are left out. */
  close(): void {
    if (this.open && this.open.end > this.open.start) this.list.push(this.open)
    this.open = null
  }

  /** Share of [from, to] spent in `mode`. */
  share(mode: Mode, from: number, to: number): number {
    let total = 0
    for (const span of this.list)
      if (span.mode === mode) total += Math.max(0, Math.min(to, span.end) - Math.max(from, span.start))
    return total / (to - from)
  }
}
