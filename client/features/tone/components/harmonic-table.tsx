/** Every harmonic in figures. */
import type { HarmonicRow } from '#client/features/tone/lib/harmonic-rows.ts'
import { formatPercent, formatQuantity, minusSign, thinSpace } from '#shared/units/format.ts'

const columns = ['frequency', 'level, peak', 'relative to the fundamental', 'per cent', 'phase']

/** One decimal, also when it is zero, so that the column lines up. */
const toTenth = (value: number) => value.toFixed(1).replace('-', minusSign)

function cells({ frequency, level, ratio, decibels, phase }: HarmonicRow): string[] {
  return [
    formatQuantity(frequency, 'Hz', { digits: 5 }),
    formatQuantity(level, 'V', { digits: 4 }),
    ratio > 0 ? `${toTenth(decibels)}${thinSpace}dB` : '–',
    formatPercent(ratio, { digits: 4 }),
    phase === null ? '–' : `${toTenth(phase)}°`,
  ]
}

export function HarmonicTable({ rows, caption }: { rows: readonly HarmonicRow[]; caption: string }) {
  return (
    <div className="overflow-x-auto border-t border-line" tabIndex={0} role="region" aria-label={caption}>
      <table className="w-full border-collapse text-sm">
        <caption className="sr-only">{caption}</caption>
        <thead className="bg-sunk">
          <tr>
            <th scope="col" className="px-4 py-1.5 text-left font-medium">
              harmonic
            </th>
            {columns.map((column) => (
              <th key={column} scope="col" className="px-3 py-1.5 text-right font-medium last:pr-4">
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.order} className="border-t border-hair">
              <th scope="row" className="px-4 py-1 text-left font-normal">
                {row.order}
              </th>
              {cells(row).map((text, index) => (
                <td key={columns[index]} className="px-3 py-1 text-right whitespace-nowrap last:pr-4">
                  {text}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <p className="max-w-prose px-4 py-2 text-sm text-soft">
        Phase of the cosine, with time zero at the rising zero of the network node; a dash where the harmonic
        is too weak to have one that means anything.
      </p>
    </div>
  )
}
