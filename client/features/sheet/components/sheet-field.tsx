import { QuantityInput } from '#client/components/circuit/quantity-input.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { useField } from '#client/features/sheet/hooks/use-field.ts'
import type { FieldName } from '#client/features/sheet/fields.ts'

export interface SheetFieldProps {
  name: FieldName
  label?: string
  /** What the engine takes while the field is empty. */
  placeholder?: string
}

/** One number of the sheet with its label and what is wrong with it. */
export function SheetField({ name, label, placeholder }: SheetFieldProps) {
  const { spec, error, input } = useField(name)
  return (
    <Field label={label ?? spec.label} error={error ?? undefined}>
      <QuantityInput {...input} placeholder={placeholder} />
    </Field>
  )
}
