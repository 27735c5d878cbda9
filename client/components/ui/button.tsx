/** Buttons. One `main` per view. */
import type { ComponentProps } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

export type ButtonVariant = 'main' | 'plain' | 'quiet' | 'danger'

const shape =
  'inline-flex min-h-8 items-center justify-center gap-2 rounded-md border px-3.5 py-1.25 text-[0.9333rem] leading-snug whitespace-nowrap no-underline transition-colors select-none'

const variants: Record<ButtonVariant, string> = {
  main: 'border-petrol bg-petrol font-medium text-on-petrol hover:bg-[color-mix(in_oklab,var(--color-petrol),var(--color-ink)_22%)]',
  plain: 'border-edge/60 bg-card text-ink hover:border-edge hover:bg-sunk',
  quiet: 'border-transparent bg-transparent px-2.5 text-petrol hover:bg-petrol-wash',
  danger:
    'border-bad bg-bad font-medium text-on-bad hover:bg-[color-mix(in_oklab,var(--color-bad),var(--color-ink)_22%)]',
}

/** The look of a button, for links too. */
export function buttonClasses(variant: ButtonVariant, className?: string): string {
  return classNames(shape, variants[variant], 'disabled:pointer-events-none disabled:opacity-55', className)
}

/** A small ring that turns; still, and so only a ring, where motion is unwanted. */
export function Spinner() {
  return (
    <span
      aria-hidden
      className="size-3.5 shrink-0 animate-spin rounded-full border-2 border-current border-r-transparent"
    />
  )
}

export interface ButtonProps extends ComponentProps<'button'> {
  variant?: ButtonVariant
  /** Work is under way: shown, announced, and a further press does nothing. */
  busy?: boolean
}

export function Button({
  variant = 'plain',
  busy = false,
  className,
  children,
  onClick,
  ...rest
}: ButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      className={buttonClasses(variant, className)}
      aria-busy={busy || undefined}
      aria-disabled={busy || undefined}
      onClick={busy ? (event) => event.preventDefault() : onClick}
    >
      {busy && <Spinner />}
      {children}
    </button>
  )
}
