import { act, fireEvent, render, screen } from '@testing-library/react'
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
  return (
    <>
      <input aria-label="Search" value={text} onChange={(event) => setText(event.target.value)} />
      <output>{`in the address: ${search}`}</output>
    </>
  )
}

const field = () => screen.getByLabelText('Search')
/** All at once: how fast a person types is not the matter here. */
const type = (value: string) => fireEvent.change(field(), { target: { value } })
const inAddress = (search: string) => screen.findByText(`in the address: ${search}`)

describe('useSearchText', () => {
  it('asks once typing rests, without spaces around', async () => {
    render(<Page />)
    type(' la')
    type(' lamp ')
    await inAddress('lamp')
    expect(onSearch.mock.calls).toEqual([['lamp']])
    expect(field()).toHaveValue(' lamp ')
  })

  it('follows the address when that changes by itself', async () => {
    onSearch.mockClear()
    render(<Page />)
    type('lamp')
    await inAddress('lamp')
    act(() => setSearch(''))
    expect(field()).toHaveValue('')
    type('lamp')
    await inAddress('lamp')
    expect(onSearch.mock.calls).toEqual([['lamp'], ['lamp']])
  })
})
