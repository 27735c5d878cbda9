import type { ComponentProps } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

/** A surface with a hairline around it. */
export function Card({ className, ...rest }: ComponentProps<'div'>) {
  return <div {...rest} className={classNames('min-w-0 rounded-lg border border-line bg-card', className)} />
}
