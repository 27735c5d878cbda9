import type { RunModeSpan } from '#shared/schemas/run.ts'

/** What governs the output, in words for a person who watches the playhead. */
export const limitWords: Record<RunModeSpan['mode'], { short: string; sentence: string }> = {
  linear: { short: 'no limit', sentence: 'No limit is active: the loop governs the output.' },
  heldHigh: { short: 'upper rail', sentence: 'The output is held at the upper rail.' },
  heldLow: { short: 'lower rail', sentence: 'The output is held at the lower rail.' },
  slewUp: { short: 'slewing up', sentence: 'The output rises at its slew rate.' },
  slewDown: { short: 'slewing down', sentence: 'The output falls at its slew rate.' },
}
