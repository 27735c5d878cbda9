import { useId } from 'react'
import { QuantityInput } from '#client/components/circuit/quantity-input.tsx'
import { classNames } from '#client/components/ui/class-names.ts'
import type { FieldName } from '#client/features/sheet/fields.ts'
import { useField } from '#client/features/sheet/hooks/use-field.ts'

export interface DrawnFieldProps {
  name: FieldName
  /** As the drawing says it; short. */
  label: string
  /** Edge of the drawing that the field stands at. */
  side: 'left' | 'right'
  /** Of the sentence in `DrawnErrors` that says what is wrong with the value. */
  errorId: string
}

/** A part's value as an input beside its symbol. What is wrong stands under the drawing, where there is room. */
export function DrawnField({ name, label, side, errorId }: DrawnFieldProps) {
  const id = useId()
  const { error, input } = useField(name)
  return (
    <>
      <label htmlFor={id} className="block text-xs whitespace-nowrap text-soft">
        {label}
      </label>
      <QuantityInput
        {...input}
        id={id}
        compact
        aria-describedby={error ? errorId : undefined}
        className={classNames('min-h-8! px-1.5! py-0.5! font-medium', side === 'left' && 'text-right')}
      />
    </>
  )
}
