import type { ComponentProps } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'
import { useFieldControl } from '#client/components/ui/field.tsx'
import { inputClasses } from '#client/components/ui/inputs.ts'

/** Several lines of text; inside a Field it is labelled and described by it. */
export function TextArea({ className, ...rest }: ComponentProps<'textarea'>) {
  return (
    <textarea rows={4} {...useFieldControl()} {...rest} className={classNames(inputClasses, className)} />
  )
}
