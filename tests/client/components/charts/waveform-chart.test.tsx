import { fireEvent, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import type { Cursors, View, WaveformSeries } from '#client/components/charts/chart-types.ts'
import { WaveformChart } from '#client/components/charts/waveform-chart.tsx'

// The canvas has a test of its own; here the behaviour around it counts.
vi.mock('#client/components/charts/waveform-canvas.tsx', () => ({ WaveformCanvas: () => null }))

const values = Float64Array.from({ length: 60_001 }, (_, i) => Math.sin(i / 100))
const series: WaveformSeries[] = [{ key: 'vo', label: 'output', unit: 'V', values, color: 'petrol' }]

/** The plot's area becomes 1000 px wide, so that a pixel is a thousandth of the view. */
function setUp(start: View = [0, 60e-3], placed: Cursors = [null, null]) {
  const latest: { view: View; cursors: Cursors } = { view: start, cursors: placed }
  function Page() {
    const [view, setView] = useState(start)
    const [cursors, setCursors] = useState(placed)
    Object.assign(latest, { view, cursors })
    return (
      <WaveformChart
        sampleInterval={1e-6}
        {...{ series, view, cursors }}
        onViewChange={setView}
        onCursorsChange={setCursors}
        playhead={30e-3}
        marks={[{ time: 40e-3, label: '90 % at 40 ms' }]}
        label="Output over time"
      />
    )
  }
  render(<Page />)
  const area = screen.getByTestId('plot-area')
  area.getBoundingClientRect = () => new DOMRect(0, 0, 1000, 200)
  return { area, latest, chart: screen.getByRole('application', { name: 'Output over time' }) }
}

const near = (value: number) => expect.closeTo(value, 9) as number

function drag(area: HTMLElement, from: number, to: number, more: object = {}) {
  fireEvent.pointerDown(area, { clientX: from, button: 0, ...more })
  fireEvent.pointerMove(area, { clientX: (from + to) / 2 })
  fireEvent.pointerMove(area, { clientX: to })
  fireEvent.pointerUp(area, { clientX: to })
  fireEvent.click(area, { clientX: to, detail: 1 })
}

describe('WaveformChart by pointer', () => {
  it('zooms to a dragged span and places no cursor by it', () => {
    const { area, latest } = setUp()
    drag(area, 700, 200)
    expect(latest.view).toEqual([near(12e-3), near(42e-3)])
    expect(latest.cursors).toEqual([null, null])
  })

  it('pans by Shift-drag, by the middle button and by a finger', () => {
    for (const how of [{ shiftKey: true }, { button: 1 }, { pointerType: 'touch' }]) {
      const { area, latest } = setUp([20e-3, 40e-3])
      drag(area, 500, 400, how)
      expect(latest.view).toEqual([near(22e-3), near(42e-3)])
      document.body.replaceChildren()
    }
  })

  it('places cursors by click and moves one by dragging it', () => {
    const { area, latest } = setUp()
    fireEvent.click(area, { clientX: 250, detail: 1 })
    fireEvent.click(area, { clientX: 750, detail: 1 })
    expect(latest.cursors).toEqual([near(15e-3), near(45e-3)])
    drag(area, 252, 500)
    expect(latest.cursors).toEqual([near(30e-3), near(45e-3)])
    expect(latest.view).toEqual([0, 60e-3])
  })

  it('shows the whole record on a double click and takes the click’s cursor back', () => {
    const { area, latest } = setUp([20e-3, 40e-3])
    fireEvent.click(area, { clientX: 250, detail: 1 })
    fireEvent.click(area, { clientX: 250, detail: 2 })
    fireEvent.doubleClick(area, { clientX: 250 })
    expect(latest).toEqual({ view: [0, 60e-3], cursors: [null, null] })
  })

  it('zooms about the pointer by wheel, and leaves the wheel to the page where nothing changes', () => {
    const { area, latest } = setUp()
    expect(fireEvent.wheel(area, { clientX: 250, deltaY: 100 })).toBe(true)
    expect(fireEvent.wheel(area, { clientX: 250, deltaY: -100 })).toBe(false)
    expect(latest.view).toEqual([near(15e-3 - 12e-3), near(15e-3 + 36e-3)])
  })
})

describe('WaveformChart by keyboard', () => {
  it('places a cursor with 1, moves it with the arrows, says so, and removes it', async () => {
    const user = userEvent.setup()
    const { chart, latest } = setUp()
    await user.tab()
    expect(chart).toHaveFocus()
    await user.keyboard('1{ArrowRight}')
    expect(latest.cursors).toEqual([near(30.3e-3), null])
    expect(screen.getByText(/Cursor 1 at 30\.3 ms, moved by the arrow keys/u)).toBeInTheDocument()
    await user.keyboard('{Delete}')
    expect(latest.cursors).toEqual([null, null])
  })

  it('zooms with plus and returns to the whole with 0', async () => {
    const user = userEvent.setup()
    const { chart, latest } = setUp()
    chart.focus()
    await user.keyboard('++')
    expect(latest.view).toEqual([near(22.5e-3), near(37.5e-3)])
    await user.keyboard('0')
    expect(latest.view).toEqual([0, 60e-3])
  })

  it('leaves shortcuts with a modifier to the browser', () => {
    const { chart, latest } = setUp([20e-3, 40e-3])
    expect(fireEvent.keyDown(chart, { key: '0', ctrlKey: true })).toBe(true)
    expect(latest.view).toEqual([20e-3, 40e-3])
  })

  it('describes its keys to those who cannot see it', () => {
    const { chart } = setUp()
    expect(chart).toHaveAccessibleDescription(/arrows move the view.*0 shows the whole record/)
  })
})

describe('WaveformChart marks', () => {
  it('puts playhead and marks where their instants are, and nothing that is out of sight', () => {
    const { area } = setUp([20e-3, 40e-3], [25e-3, 50e-3])
    expect(area.querySelector('[data-playhead]')).toHaveStyle({ left: '50.0000%' })
    expect(area.querySelector('[data-cursor="1"]')).toHaveStyle({ left: '25.0000%' })
    expect(area.querySelector('[data-cursor="2"]')).toBeNull()
    expect(screen.getByText('90 % at 40 ms')).toBeInTheDocument()
  })
})
