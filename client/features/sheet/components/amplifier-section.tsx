/** The amplifier by its class, and the figures that the model takes from it. */
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { CardSection, FieldGrid } from '#client/features/sheet/components/card-section.tsx'
import { Disclosure } from '#client/features/sheet/components/disclosure.tsx'
import { SheetField } from '#client/features/sheet/components/sheet-field.tsx'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import { amplifierClasses, amplifierClassOrigin } from '#shared/amplifier-classes.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

function withClass(content: DraftContent, key: string): DraftContent {
  const chosen = amplifierClasses.find((one) => one.key === key)
  if (!chosen) return content
  return {
    ...content,
    amplifierClass: key,
    circuit: { ...content.circuit, amplifier: chosen.figures },
  }
}

export function AmplifierSection() {
  const { content, readOnly, edit } = useEditing()
  const chosen = amplifierClasses.find(({ key }) => key === content.amplifierClass)
  return (
    <CardSection title="Amplifier">
      <Field
        label="Amplifier"
        hint={chosen ? `${chosen.use} ${amplifierClassOrigin}` : 'Figures entered by hand.'}
      >
        <Select
          value={chosen?.key ?? ''}
          disabled={readOnly}
          onChange={(event) => edit((before) => withClass(before, event.target.value))}
        >
          {!chosen && <option value="">Own figures</option>}
          {amplifierClasses.map(({ key, name }) => (
            <option key={key} value={key}>
              {name}
            </option>
          ))}
        </Select>
      </Field>
      <Disclosure summary="Amplifier figures">
        <FieldGrid>
          <SheetField name="gainBandwidth" />
          <SheetField name="openLoopGain" />
          <SheetField name="slewRate" />
          <SheetField name="offset" />
          <SheetField name="outputCurrent" placeholder="not stated" />
        </FieldGrid>
        <p className="mt-2 text-sm text-soft">
          The output impedance is taken as zero, and the rated current is checked, not enforced.
        </p>
      </Disclosure>
    </CardSection>
  )
}
