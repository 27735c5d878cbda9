/** Arithmetic of the visible span: zoom, pan and their limits. Seconds throughout. */
import type { View } from '#client/components/charts/chart-types.ts'

/** Fewest sample intervals that a view may span. */
const leastSamples = 8

/** The narrowest view of a record with this grid. */
export const leastSpan = (sampleInterval: number) => leastSamples * sampleInterval

/** `view` moved and widened as little as it takes to lie within `whole` and span at least `least`. */
export function clampView(view: View, whole: View, least: number): View {
  const longest = whole[1] - whole[0]
  if (view[0] >= whole[0] && view[1] <= whole[1] && view[1] - view[0] >= least) return view
  const span = Math.min(longest, Math.max(least, view[1] - view[0]))
  if (span === longest) return whole
  const centre = (view[0] + view[1]) / 2
  const from = Math.min(whole[1] - span, Math.max(whole[0], centre - span / 2))
  return [from, from + span]
}

/** Spans `factor` times as much, with the instant `about` staying where it is on the screen. */
export function zoomView(view: View, factor: number, about: number, whole: View, least: number): View {
  const span = view[1] - view[0]
  const wanted = Math.min(whole[1] - whole[0], Math.max(least, span * factor))
  const scale = wanted / span
  const from = about - (about - view[0]) * scale
  return clampView([from, from + wanted], whole, least)
}

/** Moved by `shift` seconds, stopping at either end of the record. */
export function panView(view: View, shift: number, whole: View): View {
  const span = view[1] - view[0]
  const from = Math.min(whole[1] - span, Math.max(whole[0], view[0] + shift))
  return [from, from + span]
}

/** The same view, moved only as far as it must to contain `time`. */
export function viewContaining(view: View, time: number, whole: View): View {
  if (time < view[0]) return panView(view, time - view[0], whole)
  if (time > view[1]) return panView(view, time - view[1], whole)
  return view
}

/** Where `time` lies in the view: 0 at its left edge, 1 at its right. */
export const fractionOf = (time: number, view: View) => (time - view[0]) / (view[1] - view[0])

/** The instant at `fraction` of the view. */
export const timeAt = (fraction: number, view: View) => view[0] + fraction * (view[1] - view[0])
