/** Two runs side by side in numbers: figures with their difference, inputs with what differs set off. */
import { Fragment, useState } from 'react'
import { Checkbox } from '#client/components/ui/checkbox.tsx'
import { Section } from '#client/features/runs/components/section.tsx'
import { Cell, GroupRow, PlainTable, RowHead } from '#client/components/ui/plain-table.tsx'
import { compareFigures, compareInputs } from '#client/features/runs/lib/compare-runs.ts'
import { formatDifference, formatShare } from '#client/features/runs/lib/format-difference.ts'
import { figure } from '#shared/figures.ts'
import type { Run } from '#shared/schemas/run.ts'
import { formatFigure } from '#shared/units/format-figure.ts'

const digits = 5

export function CompareFigures({ a, b }: { a: Run; b: Run }) {
  return (
    <Section
      title="Figures"
      note="B − A, and as a share of A; ≈ 0 where a replay of one run may differ as much."
    >
      <PlainTable caption="Figures of both runs" heads={['Figure', 'A', 'B', 'Difference', 'Share']}>
        {compareFigures(a.figures, b.figures).map((pair) => (
          <tr key={pair.key}>
            <RowHead>{figure(pair.key).name}</RowHead>
            <Cell>{formatFigure(pair.key, pair.a, { digits })}</Cell>
            <Cell>{formatFigure(pair.key, pair.b, { digits })}</Cell>
            <Cell>
              {pair.negligible ? '≈ 0' : formatDifference(pair.key, pair.difference, { signed: true })}
            </Cell>
            <Cell>{pair.negligible ? '≈ 0' : formatShare(pair.relative, { digits: 3, signed: true })}</Cell>
          </tr>
        ))}
      </PlainTable>
    </Section>
  )
}

export function CompareInputs({ a, b }: { a: Run; b: Run }) {
  const [onlyDiffering, setOnlyDiffering] = useState(false)
  const pairs = compareInputs(a.inputs, b.inputs)
  const differing = pairs.filter((pair) => pair.differs)
  const shown = onlyDiffering ? differing : pairs
  const summary =
    differing.length === 0
      ? 'No input differs.'
      : `${differing.length} of ${pairs.length} ${differing.length === 1 ? 'differs' : 'differ'}.`
  return (
    <Section
      title="Inputs"
      note={summary}
      actions={
        <Checkbox
          label="Only what differs"
          checked={onlyDiffering}
          onChange={(event) => setOnlyDiffering(event.target.checked)}
        />
      }
    >
      <PlainTable caption="Inputs of both runs" heads={['Input', 'A', 'B']}>
        {shown.map((pair, index) => (
          <Fragment key={`${pair.group} ${pair.name}`}>
            {pair.group !== shown[index - 1]?.group && <GroupRow columns={3}>{pair.group}</GroupRow>}
            <tr className={pair.differs ? 'bg-copper-wash' : undefined}>
              <RowHead>
                {pair.name}
                {pair.differs && <span className="ml-2 whitespace-nowrap text-copper">≠ differs</span>}
              </RowHead>
              <Cell strong={pair.differs} wrap>
                {pair.a ?? '–'}
              </Cell>
              <Cell strong={pair.differs} wrap>
                {pair.b ?? '–'}
              </Cell>
            </tr>
          </Fragment>
        ))}
      </PlainTable>
    </Section>
  )
}
