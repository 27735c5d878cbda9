import { recordEnd } from '#client/features/runs/lib/record-series.ts'
import type { Run } from '#shared/schemas/run.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

/**
 * The inputs of a run for computing it again. Where they left the grid to the engine, the grid that it chose then
 * stands in: sample is compared with sample even if today's engine would choose otherwise.
 */
export function replayInputs({ inputs, record }: Pick<Run, 'inputs' | 'record'>): RunInputs {
  const { duration, sampleInterval } = inputs.timing
  return {
    ...inputs,
    timing: {
      duration: duration ?? recordEnd(record),
      sampleInterval: sampleInterval ?? record.sampleInterval,
    },
  }
}
