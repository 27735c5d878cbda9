/** What sets the oscillator going. */
import { CardSection, FieldGrid } from '#client/features/sheet/components/card-section.tsx'
import { Choice } from '#client/components/ui/choice.tsx'
import { SheetField } from '#client/features/sheet/components/sheet-field.tsx'
import { stimulusNames } from '#client/features/sheet/differences.ts'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'
import { formatQuantity } from '#shared/units/format.ts'

/** Begins each stimulus with values that suit a bench. V and s. */
const beginnings: Record<Stimulus['kind'], Stimulus> = {
  offset: { kind: 'offset' },
  kick: { kind: 'kick', voltage: 0.1 },
  ramp: {
    kind: 'ramp',
    positive: { delay: 0, riseTime: 5e-3 },
    negative: { delay: 0, riseTime: 5e-3 },
  },
}

const kinds = Object.entries(stimulusNames) as [Stimulus['kind'], string][]

export function PowerOnSection() {
  const { content, readOnly, edit } = useEditing()
  const { stimulus, circuit } = content
  return (
    <CardSection title="Power-on">
      <Choice
        legend="Power-on"
        value={stimulus.kind}
        options={kinds.map(([value, label]) => ({ value, label }))}
        onChange={(kind) => edit((before) => ({ ...before, stimulus: beginnings[kind] }))}
        disabled={readOnly}
      />
      {stimulus.kind === 'offset' && (
        <p className="text-sm text-soft">
          From rest, with the amplifier’s own offset of {formatQuantity(circuit.amplifier.offset, 'V')} as the
          only disturbance.
        </p>
      )}
      {stimulus.kind === 'kick' && <SheetField name="kick" />}
      {stimulus.kind === 'ramp' && (
        <FieldGrid>
          <SheetField name="positiveDelay" label="+ rail delay" />
          <SheetField name="positiveRise" label="+ rail rise time" />
          <SheetField name="negativeDelay" label="− rail delay" />
          <SheetField name="negativeRise" label="− rail rise time" />
        </FieldGrid>
      )}
    </CardSection>
  )
}
