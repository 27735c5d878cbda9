/** The outcome of a replay in one sentence. */
import { figure } from '#shared/figures.ts'
import type { ReplayComparison } from '#shared/replay.ts'
import type { RecordLayout } from '#shared/schemas/run.ts'
import { formatPercent, formatQuantity } from '#shared/units/format.ts'

export interface ReplayVerdict {
  passes: boolean
  /** Two or three words. */
  title: string
  sentence: string
}

/** "a", "a and b", "a, b and c"; beyond four names the rest is counted. */
function joined(names: string[]): string {
  const shown = names.length > 4 ? [...names.slice(0, 3), `${names.length - 3} more`] : names
  return shown.length < 2 ? shown.join('') : `${shown.slice(0, -1).join(', ')} and ${shown.at(-1)}`
}

function failures({ figures, columns }: ReplayComparison, layout: RecordLayout): string[] {
  const outside = figures.filter((row) => !row.passes).map((row) => figure(row.key).name)
  const sentences = outside.length > 0 ? [`Outside tolerance: ${joined(outside)}.`] : []
  if (columns === null)
    return [...sentences, 'The two records lie on different grids, so no waveform was compared.']
  columns.forEach((column, index) => {
    if (column.passes) return
    const { name, unit } = layout.columns[index]!
    const size = formatQuantity(column.deviation, unit, { digits: 3 })
    const share = formatPercent(column.relative, { digits: 2 })
    const time = formatQuantity(column.time, 's')
    sentences.push(`The waveform of the ${name} deviates by up to ${size}, ${share} of its peak, at ${time}.`)
  })
  return sentences
}

/** @param layout names and units of the stored columns */
export function replayVerdict(comparison: ReplayComparison, layout: RecordLayout): ReplayVerdict {
  const { figures, columns, passes } = comparison
  if (!passes)
    return { passes, title: 'It does not replay.', sentence: failures(comparison, layout).join(' ') }
  const exact =
    figures.every((row) => row.difference === null || row.difference === 0) &&
    columns!.every((column) => column.deviation === 0)
  return {
    passes,
    title: 'It replays.',
    sentence: exact
      ? 'Every figure and every sample of the record came out the same, to the last bit.'
      : `All ${figures.length} figures and all ${columns!.length} waveforms agree within their stated tolerances.`,
  }
}
