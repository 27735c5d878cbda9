/** Every harmonic in figures. */
import { Cell, PlainTable, RowHead } from '#client/components/ui/plain-table.tsx'
import type { HarmonicRow } from '#client/components/charts/harmonic-rows.ts'
import { formatPercent, formatQuantity, minusSign, thinSpace } from '#shared/units/format.ts'

const heads = ['Harmonic', 'Frequency', 'Level, peak', 'Relative to the fundamental', 'Per cent', 'Phase']

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
    <div className="border-t border-line">
      <PlainTable caption={caption} heads={heads}>
        {rows.map((row) => (
          <tr key={row.order}>
            <RowHead>{row.order}</RowHead>
            {cells(row).map((text, index) => (
              <Cell key={heads[index + 1]}>{text}</Cell>
            ))}
          </tr>
        ))}
      </PlainTable>
      <p className="max-w-prose px-4 py-2 text-sm text-soft">
        Phase of the cosine, with time zero at the rising zero of the network node; a dash where the harmonic
        is too weak to have one that means anything.
      </p>
    </div>
  )
}
