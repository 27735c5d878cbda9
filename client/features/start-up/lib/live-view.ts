/**
 * The view of a record that is computed anew with every edit. What is asked for may run to the record's end, wherever
 * that comes to lie: then its end is Infinity, and the view follows.
 */
import type { View } from '#client/components/charts/chart-types.ts'
import { clampView } from '#client/components/charts/view-range.ts'

/** The part of a record of `end` s that shows what is asked for, at least `least` s of it. */
export function shownView([from, to]: View, end: number, least: number): View {
  if (from >= end) return [0, end]
  return clampView([from, Math.min(to, end)], [0, end], least)
}

/** What to ask for so as to see `view` of a record of `end` s. */
export function askedView([from, to]: View, end: number): View {
  return [from, to >= end ? Infinity : to]
}
