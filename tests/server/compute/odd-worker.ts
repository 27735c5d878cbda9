/** A worker that misbehaves on demand: `timing.duration` in seconds says how. */
import type { RunInputs } from '#shared/schemas/simulation.ts'

export const behaviours = { answer: 1, die: 2, throw: 3, hang: 4 }

export default function misbehave({ timing: { duration } }: RunInputs) {
  if (duration === behaviours.die) return process.exit(7)
  if (duration === behaviours.throw) throw new TypeError('a defect in the engine')
  if (duration === behaviours.hang) Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0)
  return { kind: 'solver', path: [], sentence: 'The odd worker answered.' }
}
