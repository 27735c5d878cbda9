/** A run's record as CSV (RFC 4180): one row per sample, time first, units in the header. */
import Papa from 'papaparse'
import type { RecordLayout } from '#shared/schemas/run.ts'

/** Rows per piece of the stream: about 60 kB, so that a slow reader holds little in memory. */
const rowsPerChunk = 1000
/** Enough for 250,001 samples on any grid, and short enough to hide the rounding of index × interval. */
const timeDigits = 12

/**
 * The text of the file, piece by piece. Voltages are written with all their digits, so reading them back gives the
 * stored numbers.
 * @param columns one per `layout.columns`, `layout.samples` values each
 */
export function* csvChunks(layout: RecordLayout, columns: readonly Float64Array[]): Generator<string> {
  const header = ['time (s)', ...layout.columns.map(({ name, unit }) => `${name} (${unit})`)]
  yield line([header])
  for (let start = 0; start < layout.samples; start += rowsPerChunk) {
    const length = Math.min(rowsPerChunk, layout.samples - start)
    yield line(
      Array.from({ length }, (_, row) => [
        Number(((start + row) * layout.sampleInterval).toPrecision(timeDigits)),
        ...columns.map((column) => column[start + row]),
      ]),
    )
  }
}

/** Text cells that a spreadsheet would run as a formula are quoted as text; numbers are left alone. */
const line = (rows: unknown[][]) => Papa.unparse(rows, { newline: '\r\n', escapeFormulae: true }) + '\r\n'

/** Title → a name that is safe on every file system and that no shell or spreadsheet reads as something else. */
export function downloadName(title: string, id: number): string {
  const safe = title
    .normalize('NFC')
    .replace(/[^\p{L}\p{M}\p{N} ._-]+/gu, ' ')
    .replace(/\s+/g, ' ')
    .replace(/^[ ._-]+|[ ._-]+$/g, '')
    .slice(0, 80)
    .trim()
  return `${safe || 'run'} (run ${id}).csv`
}
