import { Spinner } from '#client/components/ui/button.tsx'
import { classNames } from '#client/components/ui/class-names.ts'

export interface LoadingProps {
  /** What is on its way: "Loading designs". */
  label: string
  className?: string
}

/** Holds a place while something loads. Fades in late, so that quick answers do not flicker. */
export function Loading({ label, className }: LoadingProps) {
  return (
    <div
      role="status"
      className={classNames('late flex min-h-40 items-center justify-center gap-3 text-soft', className)}
    >
      <Spinner />
      {label}…
    </div>
  )
}
