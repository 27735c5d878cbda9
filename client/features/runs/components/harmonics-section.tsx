import { Section } from '#client/features/runs/components/section.tsx'
import { harmonicRows } from '#client/components/charts/harmonic-rows.ts'
import { Cell, PlainTable, RowHead } from '#client/components/ui/plain-table.tsx'
import { formatPercent, formatQuantity } from '#shared/units/format.ts'
import type { SettledTone } from '#sim/types.ts'

/** Harmonics of the settled tone. They are not stored with a run: a replay gives them. */
export function HarmonicsSection({ tone }: { tone: SettledTone }) {
  const rows = harmonicRows(tone.harmonics, tone.frequency)
  return (
    <Section
      title="Harmonics of the output"
      note={`From the replay, over ${tone.periods} settled ${tone.periods === 1 ? 'period' : 'periods'}.`}
    >
      <PlainTable
        caption="Harmonics of the output"
        heads={['Harmonic', 'Frequency', 'Level, peak', 'Of the fundamental']}
      >
        {rows.map(({ order, frequency, level, ratio }) => (
          <tr key={order}>
            <RowHead>{order === 1 ? 'fundamental' : order}</RowHead>
            <Cell>{formatQuantity(frequency, 'Hz', { digits: 5 })}</Cell>
            <Cell>{formatQuantity(level, 'V')}</Cell>
            <Cell>{formatPercent(ratio, { digits: 3 })}</Cell>
          </tr>
        ))}
      </PlainTable>
    </Section>
  )
}
