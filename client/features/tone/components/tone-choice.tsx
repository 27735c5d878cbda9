/** One of a few, side by side: radio buttons in a row. */
import { useId } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

export interface ToneChoiceProps<T extends string> {
  legend: string
  value: T
  onChange: (value: T) => void
  options: readonly (readonly [value: T, label: string])[]
}

export function ToneChoice<T extends string>({ legend, value, onChange, options }: ToneChoiceProps<T>) {
  const name = useId()
  return (
    <fieldset className="flex items-center">
      <legend className="sr-only">{legend}</legend>
      {options.map(([own, label]) => (
        <label
          key={own}
          className={classNames(
            'inline-flex min-h-8 cursor-pointer items-center border border-edge/60 px-2.5 text-sm first-of-type:rounded-l-md last-of-type:rounded-r-md has-focus-visible:outline-2 has-focus-visible:outline-petrol',
            own === value ? 'bg-petrol-wash font-medium text-petrol' : 'bg-card text-soft',
          )}
        >
          <input
            type="radio"
            name={name}
            className="sr-only"
            checked={own === value}
            onChange={() => onChange(own)}
          />
          {label}
        </label>
      ))}
    </fieldset>
  )
}
