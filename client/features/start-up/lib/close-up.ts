/**
 * The few cycles worth a closer look: around the time to 90 %, the first ones of what
 * dies out, the last ones of what still grows.
 */
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
  const whole: View = [0, end]
  const around = (middle: number) => clampView([middle - half, middle + half], whole, Math.min(2 * half, end))
  if (figures.timeTo90 !== null) return { title: 'Eight cycles around 90 %', view: around(figures.timeTo90) }
  if ((figures.growthRate ?? 0) < 0) return { title: 'The first eight cycles', view: around(half) }
  return { title: 'The last eight cycles', view: around(end - half) }
}
