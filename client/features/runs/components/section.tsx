import { useId, type ReactNode } from 'react'
import { Card } from '#client/components/ui/card.tsx'

export interface SectionProps {
  title: string
  /** A line beside the title. */
  note?: ReactNode
  actions?: ReactNode
  children: ReactNode
}

/** A card with a heading: one part of a runs page. */
export function Section({ title, note, actions, children }: SectionProps) {
  const id = useId()
  return (
    <section aria-labelledby={id} className="min-w-0">
      <Card className="overflow-hidden">
        <div className="flex flex-wrap items-center gap-x-4 gap-y-1 px-4 pt-3 pb-2">
          <h2 id={id} className="text-base font-medium">
            {title}
          </h2>
          {note && <p className="text-sm text-soft">{note}</p>}
          {actions && <div className="ml-auto flex flex-wrap gap-2">{actions}</div>}
        </div>
        {children}
      </Card>
    </section>
  )
}
