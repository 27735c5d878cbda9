/** Paints the limit spans behind a plot: held at a rail as a plain wash, slewing as a hatch, so that both show. */
import type uPlot from 'uplot'
import type { ChartColours } from '#client/components/charts/chart-colours.ts'
import type { LimitSpan, View } from '#client/components/charts/chart-types.ts'
import { mergedSpans } from '#client/components/charts/limit-spans.ts'

/** Distance of the hatch's lines, CSS pixels. */
const hatchStep = 7

export function paintSpans(
  plot: uPlot,
  spans: readonly LimitSpan[],
  view: View,
  colours: ChartColours,
  pixelRatio: number,
): void {
  const { ctx, bbox } = plot
  const pixel = (view[1] - view[0]) / bbox.width
  const rectangles = (kind: LimitSpan['kind']) =>
    mergedSpans(spans, kind, view, 2 * pixel).map(([start, end]) => {
      const left = bbox.left + Math.max(0, (start - view[0]) / pixel)
      const right = bbox.left + Math.min(bbox.width, (end - view[0]) / pixel)
      return [left, bbox.top, Math.max(1, right - left), bbox.height] as const
    })
  ctx.save()
  ctx.fillStyle = colours['copper-wash']
  for (const rectangle of rectangles('held')) ctx.fillRect(...rectangle)
  const slewing = rectangles('slew')
  if (slewing.length > 0) {
    ctx.beginPath()
    for (const rectangle of slewing) ctx.rect(...rectangle)
    ctx.clip()
    ctx.beginPath()
    for (let x = bbox.left - bbox.height; x < bbox.left + bbox.width; x += hatchStep * pixelRatio) {
      ctx.moveTo(x, bbox.top + bbox.height)
      ctx.lineTo(x + bbox.height, bbox.top)
    }
    ctx.globalAlpha = 0.45
    ctx.strokeStyle = colours.slate
    ctx.lineWidth = pixelRatio
    ctx.stroke()
  }
  ctx.restore()
}
