/** Stretches under a limit: out of the engine's modes, and merged to what pixels can tell apart. */
import type { LimitSpan, View } from '#client/components/charts/chart-types.ts'
import type { ModeSpan } from '#sim/types.ts'

const kinds: Partial<Record<ModeSpan['mode'], LimitSpan['kind']>> = {
  heldHigh: 'held',
  heldLow: 'held',
  slewUp: 'slew',
  slewDown: 'slew',
}

/** The spans in which the output is held at a rail or slews. */
export function limitSpans(modes: readonly ModeSpan[]): LimitSpan[] {
  return modes.flatMap(({ mode, start, end }) => {
    const kind = kinds[mode]
    return kind ? [{ kind, start, end }] : []
  })
}

/** Spans of one kind (ascending) that touch the view, those less than `gap` seconds apart joined into one. */
export function mergedSpans(
  spans: readonly LimitSpan[],
  kind: LimitSpan['kind'],
  view: View,
  gap: number,
): [start: number, end: number][] {
  const merged: [number, number][] = []
  for (const span of spans) {
    if (span.kind !== kind || span.end < view[0]) continue
    if (span.start > view[1]) break
    const latest = merged.at(-1)
    if (latest && span.start - latest[1] < gap) latest[1] = Math.max(latest[1], span.end)
    else merged.push([span.start, span.end])
  }
  return merged
}
