/** uPlot's options for a waveform chart, as a pure function of what the chart shows. */
import type uPlot from 'uplot'
import { axisLabels } from '#client/components/charts/axis-labels.ts'
import type { ChartColours } from '#client/components/charts/chart-colours.ts'
import type { WaveformSeries } from '#client/components/charts/chart-types.ts'
import { plotFrame, unitsOf } from '#client/components/charts/plot-frame.ts'

export type SeriesLook = Pick<WaveformSeries, 'key' | 'label' | 'unit' | 'color' | 'dash'>

export interface WaveformOptionsInput {
  width: number
  height: number
  series: readonly SeriesLook[]
  /** Whether the last line is the envelope, on the first unit's scale. */
  envelope: boolean
  colours: ChartColours
  /** Paints behind grid and lines. */
  paintBehind: (plot: uPlot) => void
}

const font = '12px "Fira Sans", sans-serif'

/** Scale of the nth unit: the first has its axis on the left, the second on the right. */
const scaleKey = (index: number) => `y${index}`

/** Scales are set by the chart itself with every view, so uPlot must neither fit nor pad them. */
const given: uPlot.Scale = { auto: false, range: (_plot, min, max) => [min, max] }

/** Pointer, keys and cursors are the chart's own, and its key is in words: uPlot only draws. */
export function waveformOptions(input: WaveformOptionsInput): uPlot.Options {
  const { width, height, series, colours } = input
  const units = unitsOf(series).slice(0, 2)
  const frame = plotFrame(units)
  const grid = { stroke: colours.hair, width: 1 }
  const axis = { stroke: colours.soft, font, grid, ticks: { show: false } }
  const line = (look: Partial<uPlot.Series>): uPlot.Series => ({
    points: { show: false },
    spanGaps: true,
    // Lines arrive thinned: rounding them to whole pixels would only put steps into them.
    pxAlign: 0,
    ...look,
  })
  return {
    width,
    height,
    padding: [frame.top, units.length > 1 ? 0 : frame.right, 0, 0],
    legend: { show: false },
    cursor: { show: false },
    scales: {
      x: { time: false, ...given },
      ...Object.fromEntries(units.map((_, index) => [scaleKey(index), given])),
    },
    axes: [
      {
        ...axis,
        scale: 'x',
        size: frame.bottom,
        space: 76,
        values: (_plot, ticks) => axisLabels(ticks, 's'),
      },
      ...units.map((unit, index) => ({
        ...axis,
        scale: scaleKey(index),
        side: index === 0 ? 3 : 1,
        size: index === 0 ? frame.left : frame.right,
        gap: 8,
        space: 36,
        grid: { ...grid, show: index === 0 },
        values: (_plot: uPlot, ticks: number[]) => axisLabels(ticks, unit),
      })),
    ],
    series: [
      { label: 'time' },
      ...series.map((one) =>
        line({
          label: one.label,
          scale: scaleKey(Math.max(0, units.indexOf(one.unit))),
          stroke: colours[one.color],
          width: 1.25,
          ...(one.dash ? { dash: one.dash } : {}),
        }),
      ),
      ...(input.envelope
        ? [line({ label: 'envelope', scale: scaleKey(0), stroke: colours.copper, width: 2 })]
        : []),
    ],
    hooks: { drawClear: [input.paintBehind] },
  }
}
