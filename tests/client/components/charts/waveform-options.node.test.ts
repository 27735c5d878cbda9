import { describe, expect, it, vi } from 'vitest'
import type uPlot from 'uplot'
import { waveformOptions, type WaveformOptionsInput } from '#client/components/charts/waveform-options.ts'

const colours = {
  soft: 'soft',
  hair: 'hair',
  petrol: 'petrol',
  copper: 'copper',
  plum: 'plum',
  moss: 'moss',
  slate: 'slate',
  'copper-wash': 'wash',
}
const output = { key: 'vo', label: 'output', unit: 'V', color: 'petrol' as const }
const node = { key: 'v1', label: 'network node', unit: 'V', color: 'plum' as const, dash: [5, 3] }
const filament = { key: 'control', label: 'filament', unit: 'K', color: 'moss' as const }

const build = (more: Partial<WaveformOptionsInput> = {}) =>
  waveformOptions({
    width: 800,
    height: 300,
    series: [output],
    envelope: false,
    colours,
    paintBehind: () => undefined,
    ...more,
  })

describe('waveformOptions', () => {
  it('takes time as plain numbers and leaves every scale to the chart', () => {
    const { scales } = build()
    expect(scales!.x).toMatchObject({ time: false, auto: false })
    const range = scales!.y0!.range as uPlot.Range.Function
    expect(range({} as uPlot, -3, 4, 'y0')).toEqual([-3, 4])
  })

  it('draws the series in order, each in its colour and dash, without points', () => {
    const { series } = build({ series: [output, node] })
    expect(series.slice(1)).toMatchObject([
      { label: 'output', stroke: 'petrol', scale: 'y0', points: { show: false } },
      { label: 'network node', stroke: 'plum', dash: [5, 3], scale: 'y0' },
    ])
  })

  it('puts the envelope last, in copper on the first scale', () => {
    expect(build({ envelope: true }).series.at(-1)).toMatchObject({
      label: 'envelope',
      stroke: 'copper',
      scale: 'y0',
    })
  })

  it('gives a second unit an axis of its own on the right', () => {
    const { axes, series } = build({ series: [output, filament] })
    expect(axes!.map((axis) => axis.side)).toEqual([undefined, 3, 1])
    expect(series[2]).toMatchObject({ scale: 'y1' })
    const labels = axes![2]!.values as (plot: uPlot, ticks: number[]) => string[]
    expect(labels({} as uPlot, [300, 350])).toEqual(['300\u2009K', '350\u2009K'])
  })

  it('has no legend and no cursor of its own, and paints behind the lines', () => {
    const paintBehind = vi.fn()
    const { legend, cursor, hooks } = build({ paintBehind })
    expect(legend!.show).toBe(false)
    expect(cursor!.show).toBe(false)
    expect(hooks!.drawClear).toEqual([paintBehind])
  })
})
