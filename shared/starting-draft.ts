import { amplifierClasses } from '#shared/amplifier-classes.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

const [generalPurpose] = amplifierClasses

/** What a new design begins with: equal arms near 1 kHz, a gain that starts, rails that clip. */
export const startingDraft: DraftContent = {
  circuit: {
    network: { seriesR: 10e3, seriesC: 16e-9, shuntR: 10e3, shuntC: 16e-9 },
    gain: { feedbackR: 20.5e3, groundR: 10e3 },
    amplifier: generalPurpose!.figures,
    supply: { positive: 9, negative: 9 },
    amplitudeControl: { kind: 'none' },
  },
  stimulus: { kind: 'offset' },
  timing: { duration: null, sampleInterval: null },
  ganged: true,
  series: 'E24',
  amplifierClass: generalPurpose!.key,
}
