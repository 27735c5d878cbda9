/** Label, hint and error of one input. The input inside finds its wiring by `useFieldControl`. */
import { createContext, use, useId, type ReactNode } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

interface FieldWiring {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
  'aria-required': true | undefined
}

const FieldContext = createContext<FieldWiring | null>(null)

/** Attributes that tie an input to the Field around it; none outside a Field. */
export function useFieldControl(): Partial<FieldWiring> {
  return use(FieldContext) ?? {}
}

export interface FieldProps {
  label: ReactNode
  /** What is wrong, as a sentence. */
  error?: string
  /** Help before anything is wrong; an error takes its place. */
  hint?: ReactNode
  required?: boolean
  /** Keeps the label for screen readers only. */
  labelHidden?: boolean
  className?: string
  children: ReactNode
}

export function Field({ label, error, hint, required, labelHidden, className, children }: FieldProps) {
  const id = useId()
  const hintId = `${id}-hint`
  const errorId = `${id}-error`
  const described = error ? errorId : hint ? hintId : undefined
  return (
    <div className={classNames('flex min-w-0 flex-col gap-1', className)}>
      <label htmlFor={id} className={labelHidden ? 'sr-only' : 'text-sm font-medium text-ink'}>
        {label}
      </label>
      <FieldContext
        value={{
          id,
          'aria-describedby': described,
          'aria-invalid': error ? true : undefined,
          'aria-required': required ? true : undefined,
        }}
      >
        {children}
      </FieldContext>
      {error && (
        <p id={errorId} role="alert" className="text-sm text-bad">
          {error}
        </p>
      )}
      {hint && !error && (
        <p id={hintId} className="text-sm text-soft">
          {hint}
        </p>
      )}
    </div>
  )
}
