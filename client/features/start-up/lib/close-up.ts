/** The few cycles worth a closer look: around the time to 90 %, or the last ones of the record. */
import type { View } from '#client/components/charts/chart-types.ts'
import { clampView } from '#client/components/charts/view-range.ts'
import type { Figures } from '#shared/figures.ts'

const cycles = 8

export interface CloseUp {
  title: string
  view: View
}

/**
 * @param end last instant of the record, s
 * @returns null when no frequency is known
 */
export function closeUp(figures: Figures | null, end: number): CloseUp | null {
  const frequency = figures?.frequency || figures?.linearFrequency
  if (!frequency) return null
  const half = cycles / 2 / frequency
  const at = figures.timeTo90
  const view = at === null ? ([end - 2 * half, end] as const) : ([at - half, at + half] as const)
  return {
    title: at === null ? 'The last eight cycles' : 'Eight cycles around 90 %',
    view: clampView(view, [0, end], Math.min(2 * half, end)),
  }
}
