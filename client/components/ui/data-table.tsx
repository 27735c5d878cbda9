/**
 * A list whose rows, order and pages the server decides. Wide windows get a table with sortable headers, phones a list
 * of cards with a sort select.
 */
import { flexRender, getCoreRowModel, useReactTable, type ColumnDef } from '@tanstack/react-table'
import type { ReactNode } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'
import { SortSelect, SortableHeader, type Sort } from '#client/components/ui/sorting.tsx'
import { phone, useMedia } from '#client/lib/media.ts'

export interface DataTableProps<Row> {
  /** Says what the table lists; for screen readers. */
  caption: string
  /** `enableSorting: true` makes a column sortable by its id; `meta.align: 'end'` sets numbers right. */
  columns: ColumnDef<Row, unknown>[]
  rows: readonly Row[]
  rowKey: (row: Row) => string
  sort: Sort
  onSort: (sort: Sort) => void
  /** The row on a phone. */
  card: (row: Row) => ReactNode
  /** Older rows are shown while newer ones are on their way. */
  stale?: boolean
}

export function DataTable<Row>(props: DataTableProps<Row>) {
  const { caption, columns, rows, rowKey, sort, onSort, card, stale = false } = props
  const narrow = useMedia(phone)
  const table = useReactTable({
    data: rows as Row[],
    columns,
    getRowId: rowKey,
    getCoreRowModel: getCoreRowModel(),
    manualSorting: true,
    defaultColumn: { enableSorting: false },
  })
  const dimmed = classNames('transition-opacity', stale && 'opacity-60')

  if (narrow) {
    const options = table
      .getAllLeafColumns()
      .filter((column) => column.columnDef.enableSorting)
      .map((column) => ({ id: column.id, label: String(column.columnDef.header) }))
    return (
      <div aria-busy={stale || undefined}>
        {options.length > 0 && <SortSelect options={options} sort={sort} onSort={onSort} />}
        <ul aria-label={caption} className={classNames('divide-y divide-hair', dimmed)}>
          {rows.map((row) => (
            <li key={rowKey(row)} className="px-4 py-3">
              {card(row)}
            </li>
          ))}
        </ul>
      </div>
    )
  }

  return (
    <div className="relative overflow-x-auto" aria-busy={stale || undefined}>
      <table className="w-full border-collapse text-left">
        <caption className="sr-only">{caption}</caption>
        <thead className="border-b border-line text-sm text-soft">
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header) => (
                <SortableHeader
                  key={header.id}
                  id={header.column.id}
                  sortable={header.column.columnDef.enableSorting === true}
                  align={header.column.columnDef.meta?.align}
                  sort={sort}
                  onSort={onSort}
                >
                  {flexRender(header.column.columnDef.header, header.getContext())}
                </SortableHeader>
              ))}
            </tr>
          ))}
        </thead>
        <tbody className={classNames('divide-y divide-hair', dimmed)}>
          {table.getRowModel().rows.map((row) => (
            <tr key={row.id} className="hover:bg-paper/70">
              {row.getVisibleCells().map((cell) => (
                <td
                  key={cell.id}
                  className={classNames(
                    'px-4 py-2 align-middle',
                    cell.column.columnDef.meta?.align === 'end' && 'text-right',
                  )}
                >
                  {flexRender(cell.column.columnDef.cell, cell.getContext())}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
