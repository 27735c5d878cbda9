import { z } from 'zod'
import { limits } from '#shared/limits.ts'
import { quantity } from '#shared/schemas/quantity.ts'

/** One rail's power-on: waits `delay`, then rises linearly over `riseTime`. Seconds. */
export const rampSchema = z.strictObject({
  delay: quantity('Delay', 's', limits.rampTime),
  riseTime: quantity('Rise time', 's', limits.rampTime),
})

/**
 * What sets the oscillator going at power-on. `offset`: from rest, the amplifier's own offset. `kick`: a stated
 * voltage (V) on the shunt capacitor. `ramp`: the rails rise from zero, each in its own time.
 */
export const stimulusSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('offset') }),
  z.strictObject({ kind: z.literal('kick'), voltage: quantity('Kick', 'V', limits.kickVoltage) }),
  z.strictObject({ kind: z.literal('ramp'), positive: rampSchema, negative: rampSchema }),
])

export type Ramp = z.infer<typeof rampSchema>
export type Stimulus = z.infer<typeof stimulusSchema>
