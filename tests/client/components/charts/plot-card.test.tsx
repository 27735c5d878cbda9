import { render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { CursorTable } from '#client/components/charts/cursor-table.tsx'
import { PlotCard } from '#client/components/charts/plot-card.tsx'
import { PolePlot } from '#client/components/charts/pole-plot.tsx'
import { SpectrumChart } from '#client/components/charts/spectrum-chart.tsx'

describe('PlotCard', () => {
  it('shows the same data as a table, and the plot again', async () => {
    const user = userEvent.setup()
    const table = () => ({ columns: ['time', 'output'], rows: [['0 s', '1 V']], note: 'All 1 samples.' })
    render(
      <PlotCard title="Output" keyItems={[{ label: 'envelope', sign: 'copper' }]} table={table}>
        the plot
      </PlotCard>,
    )
    expect(screen.getByText('envelope')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Show as table: Output' }))
    expect(screen.queryByText('the plot')).toBeNull()
    expect(within(screen.getByRole('table')).getByRole('cell', { name: '1 V' })).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Show as plot: Output' }))
    expect(screen.getByText('the plot')).toBeVisible()
  })
})

describe('CursorTable', () => {
  it('writes differences with their sign, and 1/Δt', () => {
    const values = Float64Array.of(0, 1, 2, 3, 4)
    const series = [{ key: 'vo', label: 'output', unit: 'V', values, color: 'petrol' }] as const
    render(<CursorTable series={series} sampleInterval={1e-3} cursors={[3e-3, 1e-3]} />)
    const cells = (name: string) =>
      within(screen.getByRole('row', { name: new RegExp(`^${name}`) }))
        .getAllByRole('cell')
        .map((cell) => cell.textContent)
    expect(cells('time')).toEqual(['3\u2009ms', '1\u2009ms', '\u22122\u2009ms1/Δt 500\u2009Hz'])
    expect(cells('output')).toEqual(['3\u2009V', '1\u2009V', '\u22122\u2009V'])
  })
})

describe('SpectrumChart', () => {
  const stems = [1, 0.1, 0.01].map((ratio, i) => ({ order: i + 1, ratio }))

  it('names itself and labels its axis in decibels or per cent', () => {
    const { rerender } = render(
      <SpectrumChart stems={stems} fundamental={1000} scale="decibel" label="Harmonics" />,
    )
    expect(screen.getByRole('img', { name: 'Harmonics' })).toBeInTheDocument()
    expect(screen.getByText('\u221220 dB')).toBeInTheDocument()
    rerender(<SpectrumChart stems={stems} fundamental={1000} scale="percent" label="Harmonics" />)
    expect(screen.getByText('10 %')).toBeInTheDocument()
    expect(screen.getByText('multiples of 1 kHz')).toBeInTheDocument()
  })
})

describe('PolePlot', () => {
  it('says which half the poles lie in, and tells of the one it does not draw', () => {
    const poles = [
      { re: 61.7, im: 6221 },
      { re: 61.7, im: -6221 },
      { re: -2.08e6, im: 0 },
    ]
    const { container } = render(<PolePlot poles={poles} />)
    expect(screen.getByRole('img')).toHaveAccessibleName(
      /Poles at \+61\.7\s1\/s ± j6\.221\skrad\/s; right of the axis/u,
    )
    expect(container.querySelectorAll('[data-pole="grows"]')).toHaveLength(2)
    expect(screen.getByText(/2,080,000\s1\/s: too fast to matter/u)).toBeVisible()
  })
})
