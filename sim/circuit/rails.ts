/**
 * How far the output can go: each supply less the amplifier's headroom on its side, rising linearly at power-on when the
 * stimulus is a ramp. Time is cut into pieces in which both rails are straight lines.
 */
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { Ramp, Stimulus } from '#shared/schemas/stimulus.ts'

/** A rail's magnitude over one piece: `level` (V) at the piece's start, `slope` in V/s, never negative. */
interface RailLine {
  level: number
  slope: number
}

export interface RailPiece {
  start: number
  /** Infinity for the last. */
  end: number
  high: RailLine
  low: RailLine
}

/** Magnitude at `t`, V. */
export function railAt(piece: RailPiece, line: RailLine, t: number): number {
  return line.slope === 0 ? line.level : line.level + line.slope * (t - piece.start)
}

/** How far the output reaches from the reference once the supplies are up, V either way. */
export function outputReach({ supply, amplifier }: Circuit): { high: number; low: number } {
  return { high: supply.positive - amplifier.headroomHigh, low: supply.negative - amplifier.headroomLow }
}

/** One rail as corner points: zero until the supply exceeds the headroom, then straight up to its full value. */
function corners(supply: number, headroom: number, ramp: Ramp | null) {
  const full = supply - headroom
  if (!ramp) return { lifts: 0, full, reaches: 0 }
  return {
    lifts: ramp.delay + ramp.riseTime * (headroom / supply),
    full,
    reaches: ramp.delay + ramp.riseTime,
  }
}

type Corners = ReturnType<typeof corners>

function lineFrom({ lifts, full, reaches }: Corners, start: number): RailLine {
  if (start >= reaches) return { level: full, slope: 0 }
  if (start < lifts) return { level: 0, slope: 0 }
  return { level: (full * (start - lifts)) / (reaches - lifts), slope: full / (reaches - lifts) }
}

/** The pieces, in order, from power-on. */
export function railPieces({ supply, amplifier }: Circuit, stimulus: Stimulus): RailPiece[] {
  const ramp = stimulus.kind === 'ramp' ? stimulus : null
  const high = corners(supply.positive, amplifier.headroomHigh, ramp?.positive ?? null)
  const low = corners(supply.negative, amplifier.headroomLow, ramp?.negative ?? null)
  const cuts = [...new Set([0, high.lifts, high.reaches, low.lifts, low.reaches])].sort((a, b) => a - b)
  return cuts.map((start, index) => ({
    start,
    end: cuts[index + 1] ?? Infinity,
    high: lineFrom(high, start),
    low: lineFrom(low, start),
  }))
}

/** When both supplies have their full value, s. */
export function railsUp(stimulus: Stimulus): number {
  if (stimulus.kind !== 'ramp') return 0
  const { positive, negative } = stimulus
  return Math.max(positive.delay + positive.riseTime, negative.delay + negative.riseTime)
}
