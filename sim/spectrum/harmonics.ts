/**
 * Harmonics of whole periods by the discrete Fourier transform (`fft-js`). Over whole periods on an even grid no window
 * is needed: each harmonic falls on one bin and nothing leaks. A corner in the waveform makes harmonics fall as 1/k², so
 * on N samples the fold-back error is of the order of 1/N² of the corner's height.
 */
import { fft } from 'fft-js'
import type { Complex } from '#sim/types.ts'

export interface HarmonicAnalysis {
  /** Mean of the samples. */
  mean: number
  /** Root mean square, mean included. */
  rms: number
  /** c_k for k = 1…count, c_k = (2/T) ∫ x exp(−jkωt) dt: peak value and phase, t = 0 at the first sample. */
  harmonics: Complex[]
}

/**
 * Analyses `samples` (a power of two of them) that span `periods` whole periods.
 * @throws RangeError when the harmonics asked for lie beyond half the sampling rate
 */
export function analyseHarmonics(samples: Float64Array, periods: number, count: number): HarmonicAnalysis {
  const n = samples.length
  if (periods * count >= n / 2)
    throw new RangeError(`${n} samples do not resolve ${count} harmonics of ${periods} periods`)
  const bins = fft(samples)
  const harmonics = Array.from({ length: count }, (_, index) => {
    const [re, im] = bins[(index + 1) * periods]!
    return { re: (2 * re) / n, im: (2 * im) / n }
  })
  const meanSquare = samples.reduce((sum, value) => sum + value * value, 0) / n
  return { mean: bins[0]![0] / n, rms: Math.sqrt(meanSquare), harmonics }
}

/** THD_F: root sum of squares of the harmonics after the first over the first (IEC 62257-1 vocabulary). */
export function totalHarmonicDistortion(harmonics: readonly Complex[]): number {
  const [fundamental, ...rest] = harmonics
  if (!fundamental) return NaN
  return (
    Math.sqrt(rest.reduce((sum, { re, im }) => sum + re * re + im * im, 0)) /
    Math.hypot(fundamental.re, fundamental.im)
  )
}
