/** What holds the level, and the device's own figures. */
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { controlNames, withControl, type ControlKind } from '#client/features/sheet/amplitude-control.ts'
import { CardSection, FieldGrid } from '#client/features/sheet/components/card-section.tsx'
import { Disclosure } from '#client/features/sheet/components/disclosure.tsx'
import { SheetField } from '#client/features/sheet/components/sheet-field.tsx'
import { useEditing } from '#client/features/sheet/editing-context.ts'

const kinds = Object.entries(controlNames) as [ControlKind, string][]

const hints: Record<ControlKind, string> = {
  none: 'Growth ends when the output is held at its rails.',
  diodes: 'Two antiparallel diodes take part of feedback R away as the output grows.',
  lamp: 'The filament warms with the output, its resistance rises and the gain falls to the critical one.',
}

export function ControlSection() {
  const { content, readOnly, edit } = useEditing()
  const { kind } = content.circuit.amplitudeControl
  return (
    <CardSection title="Amplitude control">
      <Field label="Amplitude control" hint={hints[kind]}>
        <Select
          value={kind}
          disabled={readOnly}
          onChange={(event) => edit((before) => withControl(before, event.target.value as ControlKind))}
        >
          {kinds.map(([value, name]) => (
            <option key={value} value={value}>
              {name}
            </option>
          ))}
        </Select>
      </Field>
      {kind === 'diodes' && (
        <Disclosure summary="Diode figures">
          <FieldGrid>
            <SheetField name="saturationCurrent" />
            <SheetField name="emissionCoefficient" />
            <SheetField name="thermalVoltage" />
          </FieldGrid>
          <p className="mt-2 text-sm text-soft">Typical of a small silicon diode, from memory.</p>
        </Disclosure>
      )}
      {kind === 'lamp' && (
        <Disclosure summary="Filament figures">
          <FieldGrid>
            <SheetField name="coldTemperature" />
            <SheetField name="ambientTemperature" />
            <SheetField name="thermalConductance" />
            <SheetField name="thermalCapacity" />
          </FieldGrid>
          <p className="mt-2 text-sm text-soft">
            Typical of a small filament, from memory. Nobody publishes a filament’s thermal time: measure
            yours.
          </p>
        </Disclosure>
      )}
    </CardSection>
  )
}
