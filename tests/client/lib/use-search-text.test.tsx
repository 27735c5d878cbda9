import { act, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import { useSearchText } from '#client/lib/use-search-text.ts'

const onSearch = vi.fn()
let setSearch: (search: string) => void

function Page() {
  const [search, set] = useState('')
  setSearch = set
  const [text, setText] = useSearchText(search, (wanted) => {
    onSearch(wanted)
    set(wanted)
  })
  return <input aria-label="Search" value={text} onChange={(event) => setText(event.target.value)} />
}

describe('useSearchText', () => {
  it('asks once typing rests, without spaces around', async () => {
    render(<Page />)
    await userEvent.type(screen.getByLabelText('Search'), ' lamp ')
    await vi.waitFor(() => expect(onSearch.mock.calls).toEqual([['lamp']]))
    expect(screen.getByLabelText('Search')).toHaveValue(' lamp ')
  })

  it('follows the address when that changes by itself', async () => {
    onSearch.mockClear()
    render(<Page />)
    await userEvent.type(screen.getByLabelText('Search'), 'lamp')
    await vi.waitFor(() => expect(onSearch).toHaveBeenCalledTimes(1))
    act(() => setSearch(''))
    expect(screen.getByLabelText('Search')).toHaveValue('')
    await userEvent.type(screen.getByLabelText('Search'), 'lamp')
    await vi.waitFor(() => expect(onSearch.mock.calls).toEqual([['lamp'], ['lamp']]))
  })
})
