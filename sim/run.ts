/** From a run's inputs, as stored or typed, to its simulation. */
import { issuePath } from '#shared/schemas/issue-path.ts'
import { runInputsSchema } from '#shared/schemas/simulation.ts'
import { invalid } from '#sim/failures.ts'
import { plan } from '#sim/plan.ts'
import { simulate } from '#sim/simulate.ts'
import type { Failure, SimulateOptions, Simulation } from '#sim/types.ts'

export type RunHooks = Pick<SimulateOptions, 'onProgress' | 'shouldStop'>

/**
 * Validates, plans and simulates. Bad inputs come back as a failure of kind `invalid` whose path leads to the first
 * field at fault; nothing is thrown for them.
 * @param inputs a `RunInputs`, or anything that claims to be one
 */
export function simulateRun(inputs: unknown, hooks: RunHooks = {}): Simulation | Failure {
  const parsed = runInputsSchema.safeParse(inputs)
  if (!parsed.success) {
    const issue = parsed.error.issues[0]!
    return invalid(issuePath(issue), issue.message)
  }
  const { circuit, stimulus, timing } = parsed.data
  const grid = plan(circuit, timing, stimulus)
  if ('kind' in grid) return grid
  return simulate(circuit, {
    stimulus,
    duration: grid.duration,
    sampleInterval: grid.sampleInterval,
    ...hooks,
  })
}
