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
}

/** A part's value as an input beside its symbol. What is wrong floats under it, over the drawing. */
export function DrawnField({ name, label, side }: DrawnFieldProps) {
  const id = useId()
  const { error, input } = useField(name)
  return (
    <div className="relative">
      <label htmlFor={id} className="block text-xs whitespace-nowrap text-soft">
        {label}
      </label>
      <QuantityInput
        {...input}
        id={id}
        compact
        aria-describedby={error ? `${id}-error` : undefined}
        className={classNames('min-h-8! px-1.5! py-0.5! font-medium', side === 'left' && 'text-right')}
      />
      {error && (
        <p
          id={`${id}-error`}
          role="alert"
          className={classNames(
            'absolute top-full z-10 mt-1 w-max max-w-56 rounded-md border border-bad/60 bg-bad-wash px-2 py-1 text-left text-sm text-bad shadow-float',
            side === 'left' ? 'left-0' : 'right-0',
          )}
        >
          {error}
        </p>
      )}
    </div>
  )
}
