/**
 * Harmonics of whole periods by the discrete Fourier transform (`fft-js`). Over whole periods on an even grid no window
 * is needed: each harmonic falls on one bin and nothing leaks. A corner in the waveform makes harmonics fall as 1/k², so
 * on N samples the fold-back error is of the order of 1/N² of the corner's height.
 */
import { fft } from 'fft-js'
import type { Complex } from '#sim/types.ts'

interface HarmonicAnalysis {
  /** Mean of the samples. */
  mean: number
  /** Root mean square, mean included. */
  rms: number
  /** c_k for k = 1…count, c_k = (2/T) ∫ x exp(−jkωt) dt: peak value and phase, t = 0 at the first sample. */
  harmonics: Complex[]
}

function rootMeanSquare(samples: Float64Array): number {
  return Math.sqrt(samples.reduce((sum, value) => sum + value * value, 0) / samples.length)
}

/**
 * Analyses two signals of equal length (a power of two) that each span one whole period, in one complex transform: with
 * z = a + jb, the bins of a real pair are A = (Z[k] + Z*[N−k])/2 and B = (Z[k] − Z*[N−k])/2j.
 * @throws RangeError when `count` harmonics lie beyond half the sampling rate
 */
export function analysePair(
  a: Float64Array,
  b: Float64Array,
  count: number,
): [HarmonicAnalysis, HarmonicAnalysis] {
  const n = a.length
  if (b.length !== n || 2 * count >= n)
    throw new RangeError(`${n} and ${b.length} samples do not resolve ${count} harmonics`)
  const bins = fft(Array.from(a, (value, index): [number, number] => [value, b[index]!]))
  const first: Complex[] = []
  const second: Complex[] = []
  for (let k = 1; k <= count; k++) {
    const [re, im] = bins[k]!
    const [mirrorRe, mirrorIm] = bins[n - k]!
    first.push({ re: (re + mirrorRe) / n, im: (im - mirrorIm) / n })
    second.push({ re: (im + mirrorIm) / n, im: (mirrorRe - re) / n })
  }
  const [meanA, meanB] = bins[0]!
  return [
    { mean: meanA / n, rms: rootMeanSquare(a), harmonics: first },
    { mean: meanB / n, rms: rootMeanSquare(b), harmonics: second },
  ]
}

/** THD_F: root sum of squares of the harmonics after the first over the first (IEC 62257-1 vocabulary). */
export function totalHarmonicDistortion(harmonics: readonly Complex[]): number {
  const [fundamental, ...rest] = harmonics
  if (!fundamental) return NaN
  const squares = rest.reduce((sum, { re, im }) => sum + re * re + im * im, 0)
  return Math.sqrt(squares) / Math.hypot(fundamental.re, fundamental.im)
}
