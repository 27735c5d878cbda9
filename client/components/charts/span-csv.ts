/** The visible span of a record as CSV (RFC 4180): every sample, SI units in the header, full double precision. */
import Papa from 'papaparse'
import type { View, WaveformSeries } from '#client/components/charts/chart-types.ts'
import { samplesWithin } from '#client/components/charts/decimate.ts'

/** Rows written between two breaths of the page. */
const rowsPerPiece = 20_000

/**
 * Series share the grid `sampleInterval` (s). The first column is the time in seconds.
 * @returns the file's pieces in order
 */
export async function spanCsv(
  series: readonly WaveformSeries[],
  sampleInterval: number,
  view: View,
): Promise<string[]> {
  const samples = Math.max(0, ...series.map((one) => one.values.length))
  const { first, last } = samplesWithin(samples, sampleInterval, ...view)
  const newline = '\r\n'
  const header = ['time (s)', ...series.map((one) => (one.unit ? `${one.label} (${one.unit})` : one.label))]
  const pieces = [Papa.unparse([header], { newline }) + newline]
  for (let start = first; start <= last; start += rowsPerPiece) {
    const rows = Array.from({ length: Math.min(rowsPerPiece, last - start + 1) }, (_, i) => [
      Number(((start + i) * sampleInterval).toPrecision(12)),
      ...series.map((one) => one.values[start + i]),
    ])
    pieces.push(Papa.unparse(rows, { newline }) + newline)
    await new Promise((resolve) => setTimeout(resolve))
  }
  return pieces
}

/** Hands `pieces` to the browser as a file. */
export function saveText(pieces: string[], name: string): void {
  const address = URL.createObjectURL(new Blob(pieces, { type: 'text/csv;charset=utf-8' }))
  const link = document.createElement('a')
  link.href = address
  link.download = name
  link.click()
  setTimeout(() => URL.revokeObjectURL(address))
}
