import type { ReactNode } from 'react'

export interface PageHeaderProps {
  title: ReactNode
  /** A line over the title, such as the project. */
  over?: ReactNode
  /** Chips beside the title. */
  chips?: ReactNode
  /** Buttons at the end, the main one last. */
  actions?: ReactNode
}

/** The page's one h1 and what may be done here. */
export function PageHeader({ title, over, chips, actions }: PageHeaderProps) {
  return (
    <div className="flex flex-wrap items-end gap-x-4 gap-y-3 pt-5 pb-4">
      <div className="min-w-0">
        {over && <p className="text-sm text-soft">{over}</p>}
        <h1 className="text-2xl font-medium wrap-break-word">{title}</h1>
      </div>
      {chips && <div className="flex flex-wrap gap-2 pb-0.5">{chips}</div>}
      {actions && (
        <div data-print="hidden" className="ml-auto flex flex-wrap gap-2">
          {actions}
        </div>
      )}
    </div>
  )
}
