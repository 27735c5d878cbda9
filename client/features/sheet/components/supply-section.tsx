/** Rails, split or single with a reference, and what the output keeps away from them. */
import { CardSection, FieldGrid } from '#client/features/sheet/components/card-section.tsx'
import { Choice } from '#client/components/ui/choice.tsx'
import { SheetField } from '#client/features/sheet/components/sheet-field.tsx'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import { isSingle, withSupplyKind } from '#client/features/sheet/supply.ts'
import { formatQuantity } from '#shared/units/format.ts'

function Reach({ sign, rail, headroom }: { sign: string; rail: number; headroom: number }) {
  return (
    <span className="whitespace-nowrap">
      {sign}
      {formatQuantity(rail - headroom, 'V', { digits: 3 })}
    </span>
  )
}

export function SupplySection() {
  const { content, readOnly, edit } = useEditing()
  const { supply, amplifier } = content.circuit
  const single = isSingle(supply)
  return (
    <CardSection title="Supply">
      <Choice
        legend="Supply"
        value={single ? 'single' : 'split'}
        options={[
          { value: 'split', label: 'Split' },
          { value: 'single', label: 'Single' },
        ]}
        onChange={(value) => edit((before) => withSupplyKind(before, value === 'single'))}
        disabled={readOnly}
      />
      <FieldGrid>
        {single ? (
          <>
            <SheetField name="total" />
            <SheetField name="reference" label="Reference" />
          </>
        ) : (
          <>
            <SheetField name="positive" label="Positive rail, +" />
            <SheetField name="negative" label="Negative rail, −" />
          </>
        )}
        <SheetField name="headroomHigh" />
        <SheetField name="headroomLow" />
      </FieldGrid>
      <p className="text-sm text-soft">
        {single &&
          'The reference counts from the negative rail; its own impedance is not modelled. Volts are from the reference. '}
        The output reaches from <Reach sign="−" rail={supply.negative} headroom={amplifier.headroomLow} /> to{' '}
        <Reach sign="+" rail={supply.positive} headroom={amplifier.headroomHigh} />.
      </p>
    </CardSection>
  )
}
