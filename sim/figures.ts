/** Puts the figures of one simulation together; the list and the definitions are `shared/figures.ts`. */
import type { Figures } from '#shared/figures.ts'
import type { Cycles } from '#sim/record/cycles.ts'
import type { SettledMeasurement } from '#sim/settled/measure.ts'
import { timeTo90 } from '#sim/settled/time-to-90.ts'
import type { SmallSignal } from '#sim/types.ts'

/** A figure that exists only as a finite number. */
function finite(value: number): number | null {
  return Number.isFinite(value) ? value : null
}

/** @param settled null while the record has not settled: then every settled figure is null */
export function figuresOf(linear: SmallSignal, cycles: Cycles, settled: SettledMeasurement | null): Figures {
  const level = settled && Math.max(settled.high, -settled.low)
  return {
    gain: linear.gain,
    criticalGain: finite(linear.criticalGain),
    idealCriticalGain: linear.idealCriticalGain,
    gainMargin: Number.isFinite(linear.criticalGain) ? linear.gainMargin : null,
    growthRate: linear.growthRate,
    linearFrequency: linear.frequency,
    timeTo90: level === null ? null : timeTo90(cycles.peakTimes, cycles.peakValues, level),
    frequency: settled?.tone.frequency ?? null,
    level,
    high: settled?.high ?? null,
    low: settled?.low ?? null,
    rms: settled?.rms ?? null,
    mean: settled?.mean ?? null,
    thd: settled?.thd ?? null,
    thdAtInput: settled?.thdAtInput ?? null,
    heldHigh: settled?.shares.heldHigh ?? null,
    heldLow: settled?.shares.heldLow ?? null,
    slewUp: settled?.shares.slewUp ?? null,
    slewDown: settled?.shares.slewDown ?? null,
    peakOutputCurrent: settled?.peakOutputCurrent ?? null,
  }
}
