import { Fragment } from 'react'
import { Section } from '#client/features/runs/components/section.tsx'
import { Cell, GroupRow, PlainTable, RowHead } from '#client/components/ui/plain-table.tsx'
import { inputRows } from '#client/features/runs/lib/input-rows.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

/** Every input of a run: together they decide the result. */
export function InputsSection({ inputs }: { inputs: RunInputs }) {
  const rows = inputRows(inputs)
  return (
    <Section title="Inputs" note="All that decides the result.">
      <PlainTable caption="Inputs of this run" heads={['Input', 'Value']}>
        {rows.map((row, index) => (
          <Fragment key={`${row.group} ${row.name}`}>
            {row.group !== rows[index - 1]?.group && <GroupRow columns={2}>{row.group}</GroupRow>}
            <tr>
              <RowHead>{row.name}</RowHead>
              <Cell wrap>{row.text}</Cell>
            </tr>
          </Fragment>
        ))}
      </PlainTable>
    </Section>
  )
}
