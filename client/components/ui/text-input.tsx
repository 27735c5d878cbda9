import type { ComponentProps } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'
import { useFieldControl } from '#client/components/ui/field.tsx'
import { inputClasses } from '#client/components/ui/inputs.ts'

/** One line of text; inside a Field it is labelled and described by it. */
export function TextInput({ className, ...rest }: ComponentProps<'input'>) {
  return (
    <input type="text" {...useFieldControl()} {...rest} className={classNames(inputClasses, className)} />
  )
}
