import { Section } from '#client/features/runs/components/section.tsx'
import { Cell, PlainTable, RowHead } from '#client/components/ui/plain-table.tsx'
import { Outcome } from '#client/features/runs/components/outcome.tsx'
import { formatDifference } from '#client/features/runs/lib/format-difference.ts'
import { figureDefinitions, type FigureKey } from '#shared/figures.ts'
import type { FigureComparison } from '#shared/replay.ts'
import type { Run } from '#shared/schemas/run.ts'
import { formatFigure } from '#shared/units/format-figure.ts'

/** Digits shown: more once stored and replayed stand side by side. */
const digits = { alone: 6, compared: 8 }

const heads = ['Figure', 'Value']
const comparedHeads = ['Figure', 'Stored', 'Replayed', 'Difference', 'Tolerance', 'Outcome']

function Value({ name, value, digits: shown }: { name: FigureKey; value: number | null; digits: number }) {
  if (value === null) return <span className="font-normal text-soft">does not exist</span>
  return formatFigure(name, value, { digits: shown })
}

function ComparedCells({ row }: { row: FigureComparison }) {
  return (
    <>
      <Cell>
        <Value name={row.key} value={row.stored} digits={digits.compared} />
      </Cell>
      <Cell>
        <Value name={row.key} value={row.replayed} digits={digits.compared} />
      </Cell>
      <Cell>{formatDifference(row.key, row.difference, { signed: true })}</Cell>
      <Cell>{row.tolerance === null ? '–' : `± ${formatDifference(row.key, row.tolerance)}`}</Cell>
      <Cell>
        <Outcome passes={row.passes} />
      </Cell>
    </>
  )
}

export interface FiguresSectionProps {
  run: Pick<Run, 'figures' | 'unsettled'>
  /** Figures of a replay beside the stored ones, once there is one. */
  replayed: readonly FigureComparison[] | null
}

/** Every figure of a run with its definition, as the server computed it, and as a replay did. */
export function FiguresSection({ run, replayed }: FiguresSectionProps) {
  return (
    <Section
      title={replayed ? 'Figures, stored and replayed' : 'Figures'}
      note="Stored ones were computed by the server when the run was saved."
    >
      {run.unsettled && <p className="px-4 pb-2 text-warn">! {run.unsettled}</p>}
      <PlainTable caption="Figures of this run" heads={replayed ? comparedHeads : heads}>
        {figureDefinitions.map(({ key, name, definition }) => {
          const row = replayed?.find((candidate) => candidate.key === key)
          return (
            <tr key={key} className={row && !row.passes ? 'bg-bad-wash' : undefined}>
              <RowHead note={definition}>{name}</RowHead>
              {row ? (
                <ComparedCells row={row} />
              ) : (
                <Cell strong>
                  <Value name={key} value={run.figures[key]} digits={digits.alone} />
                </Cell>
              )}
            </tr>
          )
        })}
      </PlainTable>
    </Section>
  )
}
