import type { ReactNode } from 'react'

/** A part of the circuit card under a hairline. */
export function CardSection({ title, children }: { title?: string; children: ReactNode }) {
  return (
    <section className="flex flex-col gap-3 border-t border-hair px-4 py-4" aria-label={title}>
      {children}
    </section>
  )
}

/** Fields two by two; one under another where the card is narrow. */
export function FieldGrid({ children }: { children: ReactNode }) {
  return <div className="grid grid-cols-2 items-start gap-x-4 gap-y-3">{children}</div>
}
