import type { RunModeSpan } from '#shared/schemas/run.ts'

/** What governs the output, for a person who watches the playhead. */
export const limitSentences: Record<RunModeSpan['mode'], string> = {
  linear: 'No limit is active: the loop governs the output.',
  heldHigh: 'The output is held at the upper rail.',
  heldLow: 'The output is held at the lower rail.',
  slewUp: 'The output rises at its slew rate.',
  slewDown: 'The output falls at its slew rate.',
}
