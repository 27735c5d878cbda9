import { screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { RunListPage } from '#client/features/runs/run-list-page.tsx'
import type { RunSummary } from '#shared/schemas/run.ts'
import { json, renderRuns, serve } from '#tests/client/features/runs/support/render-runs.tsx'
import { makeFigures, makeRun } from '#tests/client/features/runs/support/runs.ts'

const runs = [
  makeRun({ id: 1, title: 'First article' }),
  makeRun({ id: 2, title: 'Second article', author: { id: 9, name: 'Tilda Other' } }),
  makeRun({ id: 3, title: 'Dies out', figures: makeFigures({ frequency: null, level: null, thd: null }) }),
]
const page = (items: RunSummary[]) => ({ items, total: items.length, page: 1, pageSize: 20 })
const lists = (items: RunSummary[]) => ({
  'GET /api/runs': json(page(items)),
  'GET /api/designs': json(page([])),
})
const asked = (server: ReturnType<typeof serve>) =>
  server.mock.calls.map(([url]) => String(url)).filter((url) => url.startsWith('/api/runs'))

afterEach(() => vi.unstubAllGlobals())

describe('RunListPage', () => {
  it('lists runs with their figures and links to them', async () => {
    serve(lists(runs))
    renderRuns(<RunListPage />)
    const table = within(await screen.findByRole('table', { name: 'Saved runs' }))
    expect(table.getByRole('link', { name: 'First article' })).toHaveAttribute('href', '/runs/1')
    expect(
      table.getByRole('row', { name: /Second article.*989\.7.Hz 7\.5.V 3\.21.% Tilda Other/ }),
    ).toBeVisible()
    expect(table.getByRole('row', { name: /Dies out.*– – –/ })).toBeVisible()
  })

  it('picks two runs, in the order of picking, for comparison', async () => {
    serve(lists(runs))
    renderRuns(<RunListPage />)
    await userEvent.click(await screen.findByRole('checkbox', { name: 'Compare Dies out' }))
    expect(screen.queryByRole('link', { name: 'Compare' })).toBeNull()
    await userEvent.click(screen.getByRole('checkbox', { name: 'Compare First article' }))
    expect(screen.getByRole('link', { name: 'Compare' })).toHaveAttribute('href', '/runs/compare?a=3&b=1')
    await userEvent.click(screen.getByRole('checkbox', { name: 'Compare Second article' }))
    expect(screen.getByRole('link', { name: 'Compare' })).toHaveAttribute('href', '/runs/compare?a=3&b=2')
    expect(screen.getByRole('checkbox', { name: 'Compare First article' })).not.toBeChecked()
    await userEvent.click(screen.getByRole('button', { name: 'Clear' }))
    expect(screen.getByText('Tick two runs to compare them in one plot.')).toBeVisible()
  })

  it('asks the server for search, filters and order, which the address holds', async () => {
    const server = serve(lists(runs))
    const { router } = renderRuns(<RunListPage />, { address: '/runs?page=2&sort=title&order=asc' })
    await screen.findByRole('table')
    expect(asked(server).at(-1)).toMatch(/page=2/)
    await userEvent.selectOptions(screen.getByLabelText('Saved by'), 'Tilda Other')
    await userEvent.type(screen.getByLabelText(/^Search/), 'lamp')
    await vi.waitFor(() => expect(asked(server).at(-1)).toMatch(/search=lamp/))
    expect(asked(server).at(-1)).toMatch(/page=1.*authorId=9|authorId=9.*page=1/)
    expect(router.state.location.search).toBe('?search=lamp&order=asc&authorId=9&sort=title')
  })

  it('shows the way forward when there are no runs, and when none matches', async () => {
    serve(lists([]))
    const { unmount } = renderRuns(<RunListPage />)
    expect(await screen.findByText('No runs yet')).toBeVisible()
    expect(screen.getByRole('link', { name: 'Open a design' })).toHaveAttribute('href', '/designs')
    unmount()
    const { router } = renderRuns(<RunListPage />, { address: '/runs?search=zzz' })
    await userEvent.click(await screen.findByRole('button', { name: 'Show all runs' }))
    expect(router.state.location.search).toBe('')
    expect(screen.getByLabelText(/^Search/)).toHaveValue('')
  })

  it('says when the server is away and tries again', async () => {
    serve({})
    renderRuns(<RunListPage />)
    expect(await screen.findByRole('alert')).toHaveTextContent('The server does not answer')
    serve(lists(runs))
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }))
    expect(await screen.findByRole('table', { name: 'Saved runs' })).toBeVisible()
  })
})
