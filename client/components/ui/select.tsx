import type { ComponentProps } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'
import { useFieldControl } from '#client/components/ui/field.tsx'
import { inputClasses } from '#client/components/ui/inputs.ts'

/** The browser's own select, in our clothes. */
export function Select({ className, children, ...rest }: ComponentProps<'select'>) {
  return (
    <span className={classNames('relative block min-w-0', className)}>
      <select
        {...useFieldControl()}
        {...rest}
        className={classNames(inputClasses, 'appearance-none truncate pr-8')}
      >
        {children}
      </select>
      <svg
        aria-hidden
        viewBox="0 0 12 12"
        className="pointer-events-none absolute top-1/2 right-2.5 size-3 -translate-y-1/2 stroke-soft"
        fill="none"
        strokeWidth="1.6"
      >
        <path d="M2 4l4 4 4-4" />
      </svg>
    </span>
  )
}
