import { useId } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

export interface ChoiceProps<Value extends string> {
  legend: string
  /** Keeps the legend for screen readers only. */
  legendHidden?: boolean
  value: Value
  options: readonly { value: Value; label: string }[]
  onChange: (value: Value) => void
  disabled?: boolean
}

/** One of a few, side by side: radio buttons in a row. */
export function Choice<Value extends string>({
  legend,
  legendHidden = false,
  value,
  options,
  onChange,
  disabled,
}: ChoiceProps<Value>) {
  const name = useId()
  return (
    <fieldset disabled={disabled} className="min-w-0">
      <legend className={legendHidden ? 'sr-only' : 'mb-1 text-sm font-medium'}>{legend}</legend>
      <div className="flex rounded-md border border-edge bg-card p-0.5">
        {options.map((option) => (
          <label
            key={option.value}
            className={classNames(
              'flex min-h-8 grow cursor-pointer items-center justify-center rounded-sm px-2 text-center text-sm has-focus-visible:outline-2 has-focus-visible:outline-petrol has-disabled:cursor-not-allowed',
              option.value === value ? 'bg-petrol-wash font-medium text-petrol' : 'text-soft hover:text-ink',
            )}
          >
            <input
              type="radio"
              name={name}
              value={option.value}
              checked={option.value === value}
              onChange={() => onChange(option.value)}
              className="sr-only"
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  )
}
