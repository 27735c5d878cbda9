import { Section } from '#client/features/runs/components/section.tsx'
import { Cell, PlainTable, RowHead } from '#client/features/runs/components/table-parts.tsx'
import { formatPercent, formatQuantity } from '#shared/units/format.ts'
import type { Complex, SettledTone } from '#sim/types.ts'

const magnitude = ({ re, im }: Complex) => Math.hypot(re, im)

/** Harmonics of the settled tone. They are not stored with a run: a replay gives them. */
export function HarmonicsSection({ tone }: { tone: SettledTone }) {
  const fundamental = tone.harmonics[0] ? magnitude(tone.harmonics[0]) : 0
  return (
    <Section
      title="Harmonics of the output"
      note={`From the replay, over ${tone.periods} settled ${tone.periods === 1 ? 'period' : 'periods'}.`}
    >
      <PlainTable
        caption="Harmonics of the output"
        heads={['Harmonic', 'Frequency', 'Level, peak', 'Of the fundamental']}
      >
        {tone.harmonics.map((harmonic, index) => (
          <tr key={index}>
            <RowHead>{index === 0 ? 'fundamental' : `${index + 1}`}</RowHead>
            <Cell>{formatQuantity((index + 1) * tone.frequency, 'Hz', { digits: 5 })}</Cell>
            <Cell>{formatQuantity(magnitude(harmonic), 'V')}</Cell>
            <Cell>{formatPercent(magnitude(harmonic) / fundamental, { digits: 3 })}</Cell>
          </tr>
        ))}
      </PlainTable>
    </Section>
  )
}
