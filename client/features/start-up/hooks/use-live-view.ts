/** View and cursors of the live record, kept in the address. */
import { useMemo } from 'react'
import type { Cursors, View } from '#client/components/charts/chart-types.ts'
import { leastSpan } from '#client/components/charts/view-range.ts'
import { askedView, shownView } from '#client/features/start-up/lib/live-view.ts'
import { useViewParams } from '#client/lib/use-view-params.ts'

/**
 * @param end last instant of the record, s
 * @param sampleInterval s
 */
export function useLiveView(end: number, sampleInterval: number) {
  const [asked, change] = useViewParams(0, Infinity)
  const [from, to] = asked.view
  const view = useMemo(
    () => shownView([from, to], end, leastSpan(sampleInterval)),
    [from, to, end, sampleInterval],
  )
  return {
    view,
    setView: (next: View) => change({ view: askedView(next, end) }),
    cursors: asked.cursors,
    setCursors: (cursors: Cursors) => change({ cursors }),
  }
}
