import { Section } from '#client/features/runs/components/section.tsx'
import { Cell, PlainTable, RowHead } from '#client/features/runs/components/table-parts.tsx'
import { figureDefinitions, type Figures } from '#shared/figures.ts'
import { formatFigure } from '#shared/units/format-figure.ts'

const digits = 6

/** Every figure of a run with its definition, as the server computed it. */
export function FiguresSection({ figures, unsettled }: { figures: Figures; unsettled: string | null }) {
  return (
    <Section title="Figures" note="Computed by the server when the run was saved.">
      {unsettled && <p className="px-4 pb-2 text-warn">! {unsettled}</p>}
      <PlainTable caption="Figures of this run" heads={['Figure', 'Value']}>
        {figureDefinitions.map(({ key, name, definition }) => (
          <tr key={key}>
            <RowHead note={definition}>{name}</RowHead>
            <Cell strong>
              {figures[key] === null ? (
                <span className="font-normal text-soft">does not exist</span>
              ) : (
                formatFigure(key, figures[key], { digits })
              )}
            </Cell>
          </tr>
        ))}
      </PlainTable>
    </Section>
  )
}
