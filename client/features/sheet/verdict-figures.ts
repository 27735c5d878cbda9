/** The six figures of the verdict line. */
import type { LiveResult } from '#client/lib/live-result.ts'
import { figure, type FigureKey } from '#shared/figures.ts'
import { percentParts, quantityParts, type QuantityParts } from '#shared/units/format.ts'

export interface VerdictFigure {
  name: string
  /** Each term and what it means; one for a plain figure. */
  definitions: { name: string; definition: string }[]
  /** Null where the figure does not exist (yet). */
  parts: QuantityParts | null
  /** Belongs to an earlier edit. */
  stale: boolean
}

const definitionOf = (key: FigureKey) => {
  const { name, definition } = figure(key)
  return { name, definition }
}

const digits = 3

export function verdictFigures({ smallSignal, simulation, stale }: LiveResult): VerdictFigure[] {
  const figures = simulation?.figures ?? null
  const quantity = (key: FigureKey, unit: string, digits: number): VerdictFigure => {
    const value = figures?.[key] ?? null
    return {
      name: figure(key).name,
      definitions: [definitionOf(key)],
      parts: value === null ? null : quantityParts(value, unit, { digits }),
      stale,
    }
  }
  const high = figures?.heldHigh ?? null
  const low = figures?.heldLow ?? null
  const thd = figures?.thd ?? null
  return [
    {
      name: figure('gainMargin').name,
      definitions: [definitionOf('gainMargin'), definitionOf('gain'), definitionOf('criticalGain')],
      parts: smallSignal && percentParts(smallSignal.gainMargin, { digits, signed: true }),
      stale: false,
    },
    quantity('timeTo90', 's', 3),
    quantity('frequency', 'Hz', 4),
    { ...quantity('level', 'V', 3), name: 'Level, peak' },
    {
      name: figure('thd').name,
      definitions: [definitionOf('thd')],
      parts: thd === null ? null : percentParts(thd, { digits }),
      stale,
    },
    {
      name: 'Held at rails',
      definitions: [definitionOf('heldHigh'), definitionOf('heldLow')],
      parts: high === null || low === null ? null : percentParts(high + low, { digits }),
      stale,
    },
  ]
}
