/**
 * The five modes: which one governs at a state, what the output does in each, and the guards whose sign change ends it.
 *
 * At a rail the output is held while the amplifier, within its slew rate, would carry it further than the rail moves. It
 * leaves at the instant at which the amplifier's demand falls below the rail's own slope, so it leaves with zero
 * relative slope: the guard of the rail just left starts at zero and must not fire again (`stretch.ts` sees to that).
 */
import { railAt, type RailPiece } from '#sim/circuit/rails.ts'
import { voIndex, type Derivative, type Plant } from '#sim/circuit/plant.ts'
import type { Mode } from '#sim/types.ts'

/** A quantity that is positive while the mode lasts. */
export interface Guard {
  value(t: number, y: readonly number[]): number
  /** Time derivative of `value` along the motion of the mode. */
  rate(t: number, y: readonly number[]): number
  /** Size below which `value` is rounding. */
  resolution: number
  /** Which limit it watches; decides the next mode. */
  limit: Limit
}

type Limit = 'highRail' | 'lowRail' | 'slewUp' | 'slewDown' | 'release'

/** Rounding of guards, relative to what they compare. */
const guardRounding = 1e-12

/** `value` brought within ±`limit`. */
function clamp(value: number, limit: number): number {
  return Math.max(-limit, Math.min(limit, value))
}

/** The mode that governs from `t` on, at a state that no event has just singled out. */
export function modeAt(plant: Plant, piece: RailPiece, t: number, y: readonly number[]): Mode {
  const demand = plant.demand(y)
  const slope = clamp(demand, plant.slewRate)
  const vo = y[voIndex]!
  if (vo >= railAt(piece, piece.high, t) && slope > piece.high.slope) return 'heldHigh'
  if (vo <= -railAt(piece, piece.low, t) && slope < -piece.low.slope) return 'heldLow'
  if (demand > plant.slewRate) return 'slewUp'
  return demand < -plant.slewRate ? 'slewDown' : 'linear'
}

/** Slope that the mode imposes on the output, V/s; null in the linear mode. */
function imposedSlope(plant: Plant, piece: RailPiece, mode: Mode): number | null {
  switch (mode) {
    case 'linear':
      return null
    case 'slewUp':
      return plant.slewRate
    case 'slewDown':
      return -plant.slewRate
    case 'heldHigh':
      return piece.high.slope
    case 'heldLow':
      return -piece.low.slope
  }
}

/** Equations of motion in a mode. */
export function motion(plant: Plant, piece: RailPiece, mode: Mode): Derivative {
  const slope = imposedSlope(plant, piece, mode)
  return slope === null ? plant.linear : plant.imposed(slope)
}

/** The guards of a mode within one piece of the rails. `scale`: volts that count as large in this circuit. */
export function guardsOf(plant: Plant, piece: RailPiece, mode: Mode, scale: number): Guard[] {
  const imposed = imposedSlope(plant, piece, mode)
  const outputRate = (y: readonly number[]) => imposed ?? plant.demand(y)
  const highRail: Guard = {
    value: (t, y) => railAt(piece, piece.high, t) - y[voIndex]!,
    rate: (_t, y) => piece.high.slope - outputRate(y),
    resolution: guardRounding * scale,
    limit: 'highRail',
  }
  const lowRail: Guard = {
    value: (t, y) => railAt(piece, piece.low, t) + y[voIndex]!,
    rate: (_t, y) => piece.low.slope + outputRate(y),
    resolution: guardRounding * scale,
    limit: 'lowRail',
  }
  /** Positive while the demand is on the `sign` side of `threshold`. */
  const demandGuard = (sign: 1 | -1, threshold: number, limit: Limit): Guard => ({
    value: (_t, y) => sign * (plant.demand(y) - threshold),
    rate: (_t, y) => sign * plant.demandRate(y, outputRate(y)),
    resolution: guardRounding * scale * plant.unityRate,
    limit,
  })
  const { slewRate } = plant
  switch (mode) {
    case 'linear':
      return [highRail, lowRail, demandGuard(-1, slewRate, 'slewUp'), demandGuard(1, -slewRate, 'slewDown')]
    case 'slewUp':
      return [highRail, demandGuard(1, slewRate, 'release')]
    case 'slewDown':
      return [lowRail, demandGuard(-1, -slewRate, 'release')]
    case 'heldHigh':
      return [demandGuard(1, piece.high.slope, 'release')]
    case 'heldLow':
      return [demandGuard(-1, -piece.low.slope, 'release')]
  }
}

/** The mode that follows when a guard has fired. */
export function nextMode(limit: Limit): Mode {
  switch (limit) {
    case 'highRail':
      return 'heldHigh'
    case 'lowRail':
      return 'heldLow'
    case 'slewUp':
      return 'slewUp'
    case 'slewDown':
      return 'slewDown'
    case 'release':
      return 'linear'
  }
}
