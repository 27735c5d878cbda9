import { render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import { TonePage } from '#client/features/tone/tone-page.tsx'
import { formatPercent, formatQuantity } from '#shared/units/format.ts'
import { computed, nothingYet } from '#tests/client/components/charts/support/live.ts'

// The canvas has a test of its own.
vi.mock('#client/components/charts/waveform-canvas.tsx', () => ({ WaveformCanvas: () => null }))

const clipping = computed(21.5e3, 30e-3)
const { figures, tone } = clipping.simulation

describe('TonePage', () => {
  it('shows the figures of the settled tone and how THD is defined', () => {
    render(<TonePage live={clipping} />)
    const value = (name: string) =>
      screen
        .getAllByText(name, { selector: 'dt' })[0]!
        .nextElementSibling!.textContent?.replace(' ', '\u2009')
    expect(value('Frequency')).toBe(formatQuantity(figures!.frequency!, 'Hz', { digits: 6 }))
    expect(value('Level')).toBe(formatQuantity(figures!.level!, 'V'))
    expect(value('THD')).toBe(formatPercent(figures!.thd!))
    expect(
      screen.getAllByText(/harmonics 2 to 20 of the output over its fundamental \(THD_F\)/).at(-1),
    ).toBeVisible()
  })

  it('lists twenty harmonics of the output, and of the network node when asked', async () => {
    const user = userEvent.setup()
    render(<TonePage live={clipping} />)
    const level = (name: string) =>
      within(within(screen.getByRole('table', { name })).getAllByRole('row')[3]!).getAllByRole('cell')[1]!
        .textContent
    const peak = ({ re, im }: { re: number; im: number }) => formatQuantity(Math.hypot(re, im), 'V')
    expect(
      within(screen.getByRole('table', { name: 'Harmonics of the output' })).getAllByRole('row'),
    ).toHaveLength(21)
    expect(level('Harmonics of the output')).toBe(peak(tone!.harmonics[2]!))
    await user.click(screen.getByRole('radio', { name: 'Network node' }))
    expect(level('Harmonics of the network node')).toBe(peak(tone!.harmonicsAtInput[2]!))
  })

  it('labels the spectrum in per cent when asked', async () => {
    const user = userEvent.setup()
    render(<TonePage live={clipping} />)
    await user.click(screen.getByRole('radio', { name: '%' }))
    const spectrum = screen.getByRole('img', { name: /^Harmonics 1 to 20 of the output/ })
    expect(within(spectrum).getByText('100 %')).toBeInTheDocument()
  })

  it('closes the period that it draws: the first value comes again at its end', async () => {
    const user = userEvent.setup()
    render(<TonePage live={clipping} />)
    await user.click(screen.getByRole('button', { name: 'Show as table: One settled period' }))
    const rows = within(screen.getByRole('region', { name: 'One settled period, table' })).getAllByRole('row')
    expect(rows[1]).toHaveTextContent(/^0\ss/u)
    expect(screen.getByText(/of the 1,025 samples of the visible span/)).toBeVisible()
  })

  it('says that there is no tone when it does not start', () => {
    render(<TonePage live={computed(19e3, 30e-3)} />)
    expect(screen.getByText('There is no tone: it does not start')).toBeVisible()
    expect(screen.queryByRole('img')).toBeNull()
  })

  it('says why the tone has not settled', () => {
    const growing = computed(20.15e3, 5e-3)
    render(<TonePage live={growing} />)
    expect(growing.simulation.unsettled).not.toBeNull()
    expect(screen.getByText('The tone has not settled')).toBeVisible()
    expect(screen.getByText(growing.simulation.unsettled!)).toBeVisible()
  })

  it('waits for the first record', () => {
    render(<TonePage live={nothingYet} />)
    expect(screen.getByText('The first record is on its way')).toBeVisible()
  })
})
