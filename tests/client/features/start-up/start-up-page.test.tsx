import { render, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { describe, expect, it, vi } from 'vitest'
import { StartUpPage } from '#client/features/start-up/start-up-page.tsx'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { Supply } from '#shared/schemas/circuit.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import { computed, nothingYet } from '#tests/client/components/charts/support/live.ts'

// The canvas has a test of its own.
vi.mock('#client/components/charts/waveform-canvas.tsx', () => ({ WaveformCanvas: () => null }))

const clipping = computed(21.5e3, 30e-3)

const { circuit } = startingDraft

function renderPage(live: LiveResult, address = '/', supply: Supply = circuit.supply) {
  const page = <StartUpPage circuit={{ ...circuit, supply }} live={live} />
  const router = createMemoryRouter([{ path: '*', element: page }], { initialEntries: [address] })
  render(<RouterProvider router={router} />)
  return { router, chart: () => screen.getByRole('application', { name: /^Output from power-on/ }) }
}

describe('StartUpPage', () => {
  it('says what stops the growth, draws the record and its poles', () => {
    renderPage(clipping)
    expect(screen.getByRole('heading', { name: 'The rails stop the growth' })).toBeVisible()
    expect(
      screen.getByText(/^Record of 30\sms from power-on: 3,001 samples, one every 10\sµs$/u),
    ).toBeVisible()
    expect(screen.getByRole('heading', { name: 'Eight cycles around 90 %' })).toBeVisible()
    expect(screen.getByRole('img', { name: /^Poles at/ })).toBeInTheDocument()
    expect(screen.getAllByText('held at a rail')[0]).toBeVisible()
  })

  it('opens at the view and cursors of the address and keeps the address in step', async () => {
    const user = userEvent.setup()
    const { router, chart } = renderPage(clipping, '/?from=0.01&to=0.02&c1=0.012&tab=x')
    const region = within(chart())
    expect(region.getByText(/Showing 10\sms to 20\sms\. Cursor 1 at 12\sms/u)).toBeInTheDocument()
    chart().focus()
    await user.keyboard('0')
    await waitFor(() => expect(router.state.location.search).toBe('?c1=0.012&tab=x'))
    expect(region.getByText(/Showing 0\ss to 30\sms/u)).toBeInTheDocument()
  })

  it('reads the network node beside the output once it is asked for', async () => {
    const user = userEvent.setup()
    renderPage(clipping, '/?c1=0.012')
    const table = screen.getByRole('table', { name: 'Cursor read-outs' })
    expect(within(table).queryByRole('row', { name: /^network node/ })).toBeNull()
    await user.click(screen.getByRole('checkbox', { name: 'Network node' }))
    expect(within(table).getByRole('row', { name: /^network node .*V/u })).toBeVisible()
  })

  it('counts volts from the reference of a single supply or from its negative rail', async () => {
    const user = userEvent.setup()
    renderPage(clipping, '/?c1=0.012', { positive: 9, negative: 9, reference: 9 })
    const output = () => {
      const row = within(screen.getByRole('table', { name: 'Cursor read-outs' })).getByRole('row', {
        name: /^output/,
      })
      const [volts = ''] = /[−\d.]+(?=\sV)/u.exec(row.textContent) ?? []
      return Number(volts.replace('−', '-'))
    }
    const fromReference = output()
    await user.click(screen.getByRole('checkbox', { name: 'Volts from the negative rail' }))
    expect(output() - fromReference).toBeCloseTo(9, 3)
  })

  it('offers no other zero where the supply is split', () => {
    renderPage(clipping)
    expect(screen.queryByRole('checkbox', { name: 'Volts from the negative rail' })).toBeNull()
  })

  it('saves the visible span as CSV', async () => {
    const user = userEvent.setup()
    const saved: Blob[] = []
    vi.stubGlobal(
      'URL',
      Object.assign(URL, {
        createObjectURL: (blob: Blob) => saved.push(blob) && 'blob:x',
        revokeObjectURL: () => undefined,
      }),
    )
    const click = vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(() => undefined)
    renderPage(clipping, '/?from=0.01&to=0.02')
    await user.click(screen.getByRole('button', { name: 'Save span as CSV' }))
    await waitFor(() => expect(click).toHaveBeenCalledOnce())
    const lines = (await saved[0]!.text()).trimEnd().split('\r\n')
    expect(lines[0]).toBe('time (s),output (V)')
    expect(lines).toHaveLength(1_002)
    expect(lines[1]!.split(',').map(Number)).toEqual([0.01, clipping.simulation.vo[1_000]])
  })

  it('says that it does not start, and why', () => {
    renderPage(computed(19e3, 30e-3))
    expect(screen.getByRole('heading', { name: 'There is no growth to stop' })).toBeVisible()
    expect(screen.getByText(/below the critical gain/)).toBeVisible()
  })

  it('shows progress with Cancel while the first record is computed', async () => {
    const user = userEvent.setup()
    const cancel = vi.fn()
    renderPage({ ...nothingYet, cancel })
    expect(screen.getByRole('progressbar', { name: 'Computing the record' })).toHaveValue(0.42)
    expect(screen.getByText('The first record is on its way')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Cancel' }))
    expect(cancel).toHaveBeenCalledOnce()
  })

  it('keeps an older record in sight, marked with a word, and offers to compute after Cancel', async () => {
    const user = userEvent.setup()
    const resume = vi.fn()
    renderPage({ ...clipping, stale: true, resume })
    expect(screen.getByText('Out of date: this record belongs to earlier values')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Compute the record' }))
    expect(resume).toHaveBeenCalledOnce()
  })

  it('passes the engine’s sentence on when there is no record', () => {
    const sentence = 'The record would need too many steps: shorten it.'
    renderPage({ ...nothingYet, progress: null, failure: { kind: 'solver', path: [], sentence } })
    expect(screen.getByRole('alert')).toHaveTextContent(sentence)
  })
})
