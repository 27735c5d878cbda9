import type { ComponentProps, ReactNode } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

export interface CheckboxProps extends Omit<ComponentProps<'input'>, 'type'> {
  label: ReactNode
  /** Keeps the label for screen readers only, as in a table's selection column. */
  labelHidden?: boolean
}

/** The browser's own checkbox; box and label together are the target. */
export function Checkbox({ label, labelHidden = false, className, ...rest }: CheckboxProps) {
  return (
    <label className={classNames('inline-flex min-h-8 min-w-8 items-center gap-2', className)}>
      <input {...rest} type="checkbox" className="size-4 shrink-0 accent-petrol" />
      <span className={labelHidden ? 'sr-only' : undefined}>{label}</span>
    </label>
  )
}
