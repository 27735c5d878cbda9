import { formatAge, formatMoment } from '#client/lib/dates.ts'

/** How long ago something happened (ISO 8601), with the exact moment on hover. */
export function Age({ of, className }: { of: string; className?: string }) {
  return (
    <time dateTime={of} title={formatMoment(of)} className={className}>
      {formatAge(of)}
    </time>
  )
}
