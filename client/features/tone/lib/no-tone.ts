/** Why a record has no settled tone, and what to do about it. */
import type { Simulation, SmallSignal } from '#sim/types.ts'

export interface NoTone {
  title: string
  sentence: string
}

export function noTone(
  smallSignal: SmallSignal | null,
  { unsettled }: Pick<Simulation, 'unsettled'>,
): NoTone {
  if (smallSignal && !smallSignal.starts)
    return {
      title: 'There is no tone: it does not start',
      sentence:
        unsettled ?? 'The closed-loop gain lies below the critical gain: raise feedback R or lower ground R.',
    }
  return {
    title: 'The tone has not settled',
    sentence: unsettled ?? 'Give the record a longer duration, so that the output can settle in it.',
  }
}
