import { z } from 'zod'
import { limits } from '#shared/limits.ts'
import { circuitSchema } from '#shared/schemas/circuit.ts'
import { quantity } from '#shared/schemas/quantity.ts'
import { stimulusSchema } from '#shared/schemas/stimulus.ts'
import { seriesNames } from '#shared/units/preferred-series.ts'

/** The grid of a record as a person states it; null leaves the choice to the engine (`sim/plan.ts`). Seconds. */
export const timingSchema = z.strictObject({
  duration: quantity('Duration', 's', limits.duration).nullable(),
  sampleInterval: quantity('Sample interval', 's', limits.sampleInterval).nullable(),
})

/** Everything that decides a time-domain result: the same inputs give the same run. */
export const runInputsSchema = z.strictObject({
  circuit: circuitSchema,
  stimulus: stimulusSchema,
  timing: timingSchema,
})

/** A draft's working content: the run's inputs and how the sheet edits them. */
export const draftContentSchema = runInputsSchema.extend({
  /** Whether the two R and the two C are edited as one. */
  ganged: z.boolean(),
  /** Preferred series that the arrow keys step along (IEC 60063). */
  series: z.enum(seriesNames),
  /** Key of the amplifier class that the figures were taken from, null once edited by hand. */
  amplifierClass: z.string().max(40).nullable(),
})

export type Timing = z.infer<typeof timingSchema>
export type RunInputs = z.infer<typeof runInputsSchema>
export type DraftContent = z.infer<typeof draftContentSchema>
