/** Choosing the order of a list: a header that is a button, or a select where there are no headers. */
import type { RowData } from '@tanstack/react-table'
import type { ReactNode } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { classNames } from '#client/components/ui/class-names.ts'
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'

export interface Sort {
  id: string
  order: 'asc' | 'desc'
}

declare module '@tanstack/react-table' {
  // eslint-disable-next-line @typescript-eslint/no-unused-vars -- the names must repeat the library's
  interface ColumnMeta<TData extends RowData, TValue> {
    /** Where numbers and row actions stand. */
    align?: 'start' | 'end'
  }
}

const ariaOrder = { asc: 'ascending', desc: 'descending' } as const
const flipped = { asc: 'desc', desc: 'asc' } as const

export interface SortableHeaderProps {
  id: string
  sortable: boolean
  align?: 'start' | 'end'
  sort: Sort
  onSort: (sort: Sort) => void
  children: ReactNode
}

export function SortableHeader({ id, sortable, align, sort, onSort, children }: SortableHeaderProps) {
  const active = sort.id === id
  return (
    <th
      scope="col"
      aria-sort={active ? ariaOrder[sort.order] : undefined}
      className={classNames('px-4 font-medium', !sortable && 'py-2', align === 'end' && 'text-right')}
    >
      {sortable ? (
        <button
          type="button"
          onClick={() => onSort({ id, order: active ? flipped[sort.order] : 'asc' })}
          className={classNames(
            '-mx-1 inline-flex min-h-9 items-center gap-1 rounded-sm px-1 font-medium hover:text-ink',
            active && 'text-ink',
          )}
        >
          {children}
          <span aria-hidden className={classNames('w-3 text-xs', !active && 'invisible')}>
            {sort.order === 'asc' ? '↑' : '↓'}
          </span>
        </button>
      ) : (
        children
      )}
    </th>
  )
}

export interface SortSelectProps {
  options: readonly { id: string; label: string }[]
  sort: Sort
  onSort: (sort: Sort) => void
}

export function SortSelect({ options, sort, onSort }: SortSelectProps) {
  return (
    <div className="flex items-end gap-2 border-b border-hair px-4 py-3">
      <Field label="Sort by" className="grow">
        <Select value={sort.id} onChange={(event) => onSort({ ...sort, id: event.target.value })}>
          {options.map((option) => (
            <option key={option.id} value={option.id}>
              {option.label}
            </option>
          ))}
        </Select>
      </Field>
      <Button className="min-h-9" onClick={() => onSort({ ...sort, order: flipped[sort.order] })}>
        {sort.order === 'asc' ? 'Ascending ↑' : 'Descending ↓'}
      </Button>
    </div>
  )
}
