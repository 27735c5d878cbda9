/** The drawn part of a waveform chart: uPlot's canvas with lines, grid, axes and washes. No behaviour. */
import { memo, useEffect, useMemo, useRef } from 'react'
import uPlot from 'uplot'
import 'uplot/dist/uPlot.min.css'
import { useChartColours } from '#client/components/charts/chart-colours.ts'
import type { EnvelopeLine, LimitSpan, View, WaveformSeries } from '#client/components/charts/chart-types.ts'
import { drawnGrid, drawnPoints, type DrawnLine } from '#client/components/charts/decimate.ts'
import { paintSpans } from '#client/components/charts/paint-spans.ts'
import { unitsOf, valueRange } from '#client/components/charts/plot-frame.ts'
import { waveformOptions, type SeriesLook } from '#client/components/charts/waveform-options.ts'

export interface WaveformCanvasProps {
  width: number
  height: number
  sampleInterval: number
  series: readonly WaveformSeries[]
  envelope?: EnvelopeLine
  spans: readonly LimitSpan[]
  view: View
}

/** The lines of all series and then of the envelope, thinned to the pixels of the view. */
function drawnLines(props: WaveformCanvasProps): DrawnLine[] {
  const { series, sampleInterval, envelope, view, width } = props
  const columns = Math.max(1, Math.round(width * Math.min(2, window.devicePixelRatio || 1)))
  const lines = series.map((one) =>
    drawnGrid(one.values, one.sampleInterval ?? sampleInterval, ...view, columns),
  )
  return envelope ? [...lines, drawnPoints(envelope, ...view, columns)] : lines
}

/** What of the series decides the options; a new record of the same series leaves the plot standing. */
function useLooks(series: readonly WaveformSeries[]): readonly SeriesLook[] {
  const text = JSON.stringify(
    series.map(({ key, label, unit, color, dash }) => ({ key, label, unit, color, dash })),
  )
  return useMemo(() => JSON.parse(text) as SeriesLook[], [text])
}

export const WaveformCanvas = memo(function WaveformCanvas(props: WaveformCanvasProps) {
  const { width, height, series, sampleInterval, envelope, spans, view } = props
  const host = useRef<HTMLDivElement>(null)
  const plot = useRef<uPlot | null>(null)
  const colours = useChartColours()
  const looks = useLooks(series)
  const hasEnvelope = envelope !== undefined
  const behind = useRef<((plot: uPlot) => void) | null>(null)

  // Mount and destroy: the plot lives as long as its series and colours do.
  useEffect(() => {
    if (!host.current) return
    const made = new uPlot(
      waveformOptions({
        width: host.current.clientWidth,
        height: host.current.clientHeight,
        series: looks,
        envelope: hasEnvelope,
        colours,
        paintBehind: (target) => behind.current?.(target),
      }),
      undefined,
      host.current,
    )
    plot.current = made
    return () => {
      plot.current = null
      made.destroy()
    }
  }, [looks, hasEnvelope, colours])

  useEffect(() => {
    if (width > 0) plot.current?.setSize({ width, height })
  }, [width, height, looks, hasEnvelope, colours])

  useEffect(() => {
    const target = plot.current
    if (!target || width === 0) return
    const lines = drawnLines({ width, height, series, sampleInterval, envelope, spans, view })
    behind.current = (drawn) => paintSpans(drawn, spans, view, colours, uPlot.pxRatio)
    const tables = lines.map((line): uPlot.AlignedData => [line.time, line.value])
    const units = unitsOf(series).slice(0, 2)
    target.batch(() => {
      target.setData(uPlot.join(tables), false)
      target.setScale('x', { min: view[0], max: view[1] })
      units.forEach((unit, index) => {
        const own = lines.filter((_, i) => (series[i]?.unit ?? units[0]) === unit)
        const [min, max] = valueRange(own.map((line) => line.value))
        target.setScale(`y${index}`, { min, max })
      })
    })
  }, [width, height, series, sampleInterval, envelope, spans, view, looks, hasEnvelope, colours])

  return <div ref={host} className="absolute inset-0 overflow-hidden" aria-hidden="true" />
})
