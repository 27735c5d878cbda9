import type { ReactNode } from 'react'

/** Details that are there when wanted: the browser's own disclosure. */
export function Disclosure({ summary, children }: { summary: string; children: ReactNode }) {
  return (
    <details className="group">
      <summary className="flex min-h-8 cursor-pointer list-none items-center gap-1.5 text-sm text-petrol">
        <svg
          aria-hidden
          viewBox="0 0 12 12"
          className="size-3 fill-none stroke-current transition-transform group-open:rotate-90"
          strokeWidth="1.6"
        >
          <path d="M4 2l4 4-4 4" />
        </svg>
        {summary}
      </summary>
      <div className="pt-1 pb-2">{children}</div>
    </details>
  )
}
