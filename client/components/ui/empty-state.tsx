import type { ReactNode } from 'react'

export interface EmptyStateProps {
  title: string
  children?: ReactNode
  /** The way forward. */
  action?: ReactNode
}

/** Nothing is here yet, or nothing was found: says which, and offers the next step. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-center gap-2 px-6 py-12 text-center">
      <svg
        aria-hidden
        viewBox="0 0 120 36"
        className="mb-2 h-9 w-30 stroke-faint"
        fill="none"
        strokeWidth="1.5"
      >
        <path d="M2 18H118" strokeDasharray="2 4" className="stroke-line" />
        <path d="M2 18c4-5 8-5 12 0s8 5 12 0 8-5 12 0 8 5 12 0" strokeLinecap="round" />
      </svg>
      <p className="text-lg font-medium">{title}</p>
      {children && <div className="max-w-prose text-soft">{children}</div>}
      {action && <div className="mt-3 flex flex-wrap justify-center gap-2">{action}</div>}
    </div>
  )
}
