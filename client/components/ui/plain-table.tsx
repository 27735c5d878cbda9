/** Plain tables of numbers: one look for figures, harmonics, inputs and comparisons. */
import type { ReactNode } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

export interface PlainTableProps {
  /** What the table lists; for screen readers. */
  caption: string
  /** Column heads; the first is of the row heads. */
  heads: readonly string[]
  children: ReactNode
}

/** Wider than its place, it scrolls within its card. The first column is text, the rest numbers. */
export function PlainTable({ caption, heads, children }: PlainTableProps) {
  return (
    <div className="overflow-x-auto" role="group" aria-label={caption} tabIndex={0}>
      <table className="w-full border-collapse">
        <caption className="sr-only">{caption}</caption>
        <thead className="border-b border-line text-sm text-soft">
          <tr>
            {heads.map((head) => (
              <th key={head} scope="col" className="px-4 py-2 text-right font-medium first:text-left">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="divide-y divide-hair">{children}</tbody>
      </table>
    </div>
  )
}

/** Names the row; `note` explains it below. */
export function RowHead({ children, note }: { children: ReactNode; note?: string }) {
  return (
    <th scope="row" className="min-w-34 px-4 py-1.5 sm:min-w-40 text-left align-baseline font-normal">
      {children} {note && <span className="block max-w-prose text-sm text-soft">{note}</span>}
    </th>
  )
}

export interface CellProps {
  children: ReactNode
  strong?: boolean
  /** For words, which may break; numbers stay on one line. */
  wrap?: boolean
}

/** One value, set right. */
export function Cell({ children, strong = false, wrap = false }: CellProps) {
  return (
    <td
      className={classNames(
        'px-4 py-1.5 text-right align-baseline',
        !wrap && 'whitespace-nowrap',
        strong && 'font-medium',
      )}
    >
      {children}
    </td>
  )
}

/** A row that names the group of the rows below it. */
export function GroupRow({ children, columns }: { children: ReactNode; columns: number }) {
  return (
    <tr className="bg-sunk">
      <th scope="colgroup" colSpan={columns} className="px-4 py-1 text-left text-sm font-medium text-soft">
        {children}
      </th>
    </tr>
  )
}
