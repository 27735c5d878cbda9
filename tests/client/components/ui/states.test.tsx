import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import { Pager } from '#client/components/ui/pager.tsx'
import { ApiError, OfflineError } from '#client/lib/api.ts'

const refusal = (status: number, detail: string) =>
  new ApiError({ type: 'about:blank', title: 'No.', status, code: 'any', detail })

describe('ErrorState', () => {
  it.each([
    [refusal(404, 'There is no design 9.'), 'Not found', 'There is no design 9.'],
    [refusal(403, 'Ask an engineer.'), 'Not permitted', 'Ask an engineer.'],
    [refusal(500, 'See the log.'), 'The server could not do that', 'See the log.'],
    [new OfflineError(), 'The server does not answer', /cannot be reached/],
    [new TypeError('x is undefined'), 'This part of the page failed', /Reload it/],
  ])('tells %s in words', (error, title, sentence) => {
    render(<ErrorState error={error} />)
    const box = screen.getByRole('alert')
    expect(box).toHaveTextContent(title)
    expect(box).toHaveTextContent(sentence)
    expect(screen.queryByRole('button')).not.toBeInTheDocument()
  })

  it('offers another try', async () => {
    const retry = vi.fn()
    render(<ErrorState error={new OfflineError()} retry={retry} />)
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }))
    expect(retry).toHaveBeenCalledTimes(1)
  })

  it('leads on from what is not there instead of asking for it again', () => {
    const action = <a href="/runs">All runs</a>
    render(<ErrorState error={refusal(404, 'There is no run 9.')} retry={vi.fn()} action={action} />)
    expect(screen.getByRole('link', { name: 'All runs' })).toBeInTheDocument()
    expect(screen.queryByRole('button', { name: 'Try again' })).not.toBeInTheDocument()
  })
})

describe('Notice', () => {
  it('interrupts only for trouble, and says its tone in words', () => {
    render(
      <>
        <Notice tone="bad">Nothing was saved.</Notice>
        <Notice tone="ok">Saved.</Notice>
      </>,
    )
    expect(screen.getByRole('alert')).toHaveTextContent('Problem: Nothing was saved.')
    expect(screen.getByRole('status')).toHaveTextContent('Done: Saved.')
  })
})

describe('Pager', () => {
  it('counts, and ends at both ends', async () => {
    const onPage = vi.fn()
    const { rerender } = render(
      <Pager noun="run" list={{ page: 1, pageSize: 20, total: 41 }} onPage={onPage} />,
    )
    expect(screen.getByText('1–20 of 41 runs')).toBeInTheDocument()
    expect(screen.getByRole('button', { name: 'Previous' })).toBeDisabled()
    await userEvent.click(screen.getByRole('button', { name: 'Next' }))
    expect(onPage).toHaveBeenCalledWith(2)
    rerender(<Pager noun="run" list={{ page: 3, pageSize: 20, total: 41 }} onPage={onPage} />)
    expect(screen.getByText('41 of 41 runs')).toBeInTheDocument()
    expect(screen.getByRole('button', { name: 'Next' })).toBeDisabled()
  })

  it('counts one as one', () => {
    render(<Pager noun="run" list={{ page: 1, pageSize: 20, total: 1 }} onPage={() => undefined} />)
    expect(screen.getByText('1 of 1 run')).toBeInTheDocument()
  })

  it('needs no buttons for one page', () => {
    render(<Pager noun="run" list={{ page: 1, pageSize: 20, total: 0 }} onPage={() => undefined} />)
    expect(screen.getByText('0 of 0 runs')).toBeInTheDocument()
    expect(screen.queryByRole('button')).not.toBeInTheDocument()
  })
})
