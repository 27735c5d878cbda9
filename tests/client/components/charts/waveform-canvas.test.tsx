import { act, render } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'
import { WaveformCanvas, type WaveformCanvasProps } from '#client/components/charts/waveform-canvas.tsx'
import { chooseTheme } from '#client/lib/theme.ts'

// uPlot needs a canvas and matchMedia, which this environment has not: what it is told is recorded instead.
const { plots, FakePlot } = vi.hoisted(() => {
  const plots: { calls: [string, ...unknown[]][]; options: { series: { label: string }[] } }[] = []
  class FakePlot {
    static pxRatio = 1
    static join = (tables: unknown[]) => tables
    calls: [string, ...unknown[]][] = []
    constructor(readonly options: { series: { label: string }[] }) {
      plots.push(this)
    }
    batch(change: () => void) {
      change()
    }
    setData = (...args: unknown[]) => this.calls.push(['setData', ...args])
    setScale = (...args: unknown[]) => this.calls.push(['setScale', ...args])
    setSize = (...args: unknown[]) => this.calls.push(['setSize', ...args])
    destroy = () => this.calls.push(['destroy'])
  }
  return { plots, FakePlot }
})
vi.mock('uplot', () => ({ default: FakePlot }))

const values = Float64Array.from({ length: 10_001 }, (_, i) => 5 * Math.sin((2 * Math.PI * i) / 1_000))
const series: WaveformSeries[] = [{ key: 'vo', label: 'output', unit: 'V', values, color: 'petrol' }]
const props: WaveformCanvasProps = {
  width: 500,
  height: 200,
  sampleInterval: 1e-6,
  series,
  spans: [],
  view: [0, 10e-3],
}
const calls = (name: string) => plots.flatMap((plot) => plot.calls.filter(([called]) => called === name))

beforeEach(() => void (plots.length = 0))
afterEach(() => act(() => chooseTheme('auto')))

describe('WaveformCanvas', () => {
  it('gives the plot thinned lines that keep the peaks, and both scales', () => {
    render(<WaveformCanvas {...props} />)
    const [, tables] = calls('setData')[0] as [string, [Float64Array, Float64Array][]]
    const [time, value] = tables[0]!
    expect(time.length).toBeLessThanOrEqual(1_002)
    expect(Math.max(...value)).toBe(5)
    expect(calls('setScale')).toContainEqual(['setScale', 'x', { min: 0, max: 10e-3 }])
    const [, , range] = calls('setScale').find(([, key]) => key === 'y0') as [
      string,
      string,
      { min: number; max: number },
    ]
    expect(range.min).toBeLessThan(-5)
    expect(range.max).toBeGreaterThan(5)
  })

  it('draws another view and another size on the same plot', () => {
    const { rerender } = render(<WaveformCanvas {...props} />)
    rerender(<WaveformCanvas {...props} view={[1e-3, 2e-3]} width={600} />)
    expect(plots).toHaveLength(1)
    expect(calls('setSize').at(-1)).toEqual(['setSize', { width: 600, height: 200 }])
    expect(calls('setScale')).toContainEqual(['setScale', 'x', { min: 1e-3, max: 2e-3 }])
    expect(calls('destroy')).toEqual([])
  })

  it('keeps the plot for a new record of the same series, and makes another for other series', () => {
    const { rerender } = render(<WaveformCanvas {...props} />)
    rerender(
      <WaveformCanvas {...props} series={[{ ...series[0]!, values: values.map((value) => value / 2) }]} />,
    )
    expect(plots).toHaveLength(1)
    rerender(
      <WaveformCanvas {...props} series={[...series, { ...series[0]!, key: 'v1', label: 'network node' }]} />,
    )
    expect(plots).toHaveLength(2)
    expect(plots[0]!.calls.at(-1)).toEqual(['destroy'])
    expect(plots[1]!.options.series.map((one) => one.label)).toEqual(['time', 'output', 'network node'])
  })

  it('draws anew in the colours of another theme, and destroys its plot when it goes', () => {
    const { unmount } = render(<WaveformCanvas {...props} />)
    act(() => chooseTheme('dark'))
    expect(plots).toHaveLength(2)
    unmount()
    expect(calls('destroy')).toHaveLength(2)
  })
})
