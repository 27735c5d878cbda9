/** Whether the two arms are edited as one, how far apart they are, and the series that arrow keys follow. */
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { Choice } from '#client/components/ui/choice.tsx'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import { mismatch, withGang } from '#client/features/sheet/gang.ts'
import { formatPercent } from '#shared/units/format.ts'
import { seriesNames, type SeriesName } from '#shared/units/preferred-series.ts'

const apart = (ratio: number) => formatPercent(ratio, { digits: 3, signed: true })

export function GangRow() {
  const { content, readOnly, edit } = useEditing()
  const { r, c } = mismatch(content.circuit.network)
  return (
    <div className="grid grid-cols-[1fr_auto] items-start gap-x-4 gap-y-2">
      <Choice
        legend="R and C of both arms"
        value={content.ganged ? 'ganged' : 'split'}
        options={[
          { value: 'ganged', label: 'Ganged' },
          { value: 'split', label: 'Split' },
        ]}
        onChange={(value) => edit((before) => withGang(before, value === 'ganged'))}
        disabled={readOnly}
      />
      <Field label="Series" className="w-24">
        <Select
          value={content.series}
          disabled={readOnly}
          onChange={(event) => edit((before) => ({ ...before, series: event.target.value as SeriesName }))}
        >
          {seriesNames.map((name) => (
            <option key={name}>{name}</option>
          ))}
        </Select>
      </Field>
      <p className="col-span-2 text-sm text-soft">
        {content.ganged ? (
          'Editing one arm sets the other. '
        ) : (
          <>
            Mismatch, shunt against series: R <b className="whitespace-nowrap text-ink">{apart(r)}</b>, C{' '}
            <b className="whitespace-nowrap text-ink">{apart(c)}</b>.{' '}
          </>
        )}
        Arrow keys step along {content.series}, with Shift finely.
      </p>
    </div>
  )
}
