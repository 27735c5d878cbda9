/** The harmonics of a settled tone as figures that a person reads. */
import { decibels } from '#client/components/charts/spectrum-levels.ts'
import type { Complex } from '#sim/types.ts'

export interface HarmonicRow {
  /** 1 for the fundamental. */
  order: number
  /** Hz. */
  frequency: number
  /** V peak. */
  level: number
  /** To the fundamental. */
  ratio: number
  /** 20 log10 of `ratio`. */
  decibels: number
  /**
   * Of the cosine, degrees in (−180, 180], t = 0 at the rising zero of the network node; null where the harmonic is
   * too weak for its phase to mean anything.
   */
  phase: number | null
}

/** Weakest ratio whose phase is told: below lies the rounding of the computation. */
const weakestPhase = 1e-7

/** @param harmonics k = 1, 2, …: peak volts, c_k = (2/T) ∫ x exp(−jkωt) dt */
export function harmonicRows(harmonics: readonly Complex[], frequency: number): HarmonicRow[] {
  const fundamental = harmonics[0] ? Math.hypot(harmonics[0].re, harmonics[0].im) : 0
  return harmonics.map(({ re, im }, index) => {
    const level = Math.hypot(re, im)
    const ratio = fundamental > 0 ? level / fundamental : 0
    return {
      order: index + 1,
      frequency: (index + 1) * frequency,
      level,
      ratio,
      decibels: decibels(ratio),
      phase: ratio >= weakestPhase ? (Math.atan2(im, re) * 180) / Math.PI : null,
    }
  })
}
