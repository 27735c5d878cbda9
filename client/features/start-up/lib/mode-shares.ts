/** How the time divides among the limits: in a settled period, or over the record where nothing has settled. */
import type { Mode, Simulation } from '#sim/types.ts'

export interface ModeShares {
  of: 'settled' | 'record'
  shares: Record<Mode, number>
}

const none: Record<Mode, number> = { linear: 0, heldHigh: 0, heldLow: 0, slewUp: 0, slewDown: 0 }

export function modeShares({ figures, modes }: Pick<Simulation, 'figures' | 'modes'>): ModeShares {
  const { heldHigh, heldLow, slewUp, slewDown } = figures ?? none
  if (heldHigh !== null && heldLow !== null && slewUp !== null && slewDown !== null && figures) {
    const linear = Math.max(0, 1 - heldHigh - heldLow - slewUp - slewDown)
    return { of: 'settled', shares: { linear, heldHigh, heldLow, slewUp, slewDown } }
  }
  const shares = { ...none }
  const duration = (modes.at(-1)?.end ?? 0) - (modes[0]?.start ?? 0)
  for (const { mode, start, end } of modes) shares[mode] += (end - start) / duration
  return { of: 'record', shares }
}
