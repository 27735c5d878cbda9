import type { ColumnDef } from '@tanstack/react-table'
import { render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { DataTable } from '#client/components/ui/data-table.tsx'

interface Part {
  key: string
  name: string
  value: number
}

const parts: Part[] = [
  { key: 'r1', name: 'Series R', value: 10 },
  { key: 'c1', name: 'Series C', value: 16 },
]
const columns: ColumnDef<Part, unknown>[] = [
  { id: 'name', header: 'Name', enableSorting: true, cell: ({ row }) => row.original.name },
  { id: 'value', header: 'Value', meta: { align: 'end' }, cell: ({ row }) => row.original.value },
]

function show(stale = false) {
  const onSort = vi.fn()
  render(
    <DataTable
      caption="Parts"
      columns={columns}
      rows={parts}
      rowKey={(part) => part.key}
      sort={{ id: 'name', order: 'asc' }}
      onSort={onSort}
      card={(part) => <p>{part.name}</p>}
      stale={stale}
    />,
  )
  return { onSort, user: userEvent.setup() }
}

afterEach(() => vi.unstubAllGlobals())

describe('in a wide window', () => {
  it('is a named table whose sortable headers are buttons', async () => {
    const { onSort, user } = show()
    const table = screen.getByRole('table', { name: 'Parts' })
    expect(within(table).getAllByRole('row')).toHaveLength(3)
    expect(within(table).getByRole('columnheader', { name: /Name/ })).toHaveAttribute(
      'aria-sort',
      'ascending',
    )
    expect(within(table).queryByRole('button', { name: 'Value' })).not.toBeInTheDocument()
    await user.tab()
    await user.keyboard('{Enter}')
    expect(onSort).toHaveBeenCalledWith({ id: 'name', order: 'desc' })
  })

  it('says that newer rows are on their way', () => {
    show(true)
    expect(screen.getByRole('table').parentElement).toHaveAttribute('aria-busy', 'true')
  })
})

describe('on a phone', () => {
  it('is a named list of cards with a choice of order', async () => {
    vi.stubGlobal('matchMedia', () => Object.assign(new EventTarget(), { matches: true }))
    const { onSort, user } = show()
    expect(screen.queryByRole('table')).not.toBeInTheDocument()
    expect(within(screen.getByRole('list', { name: 'Parts' })).getAllByRole('listitem')).toHaveLength(2)
    const select = screen.getByLabelText('Sort by')
    expect(within(select).getAllByRole('option')).toHaveLength(1)
    await user.click(screen.getByRole('button', { name: /Ascending/ }))
    expect(onSort).toHaveBeenCalledWith({ id: 'name', order: 'desc' })
  })
})
