/** Entry of the worker threads. The packed record is moved to the caller, not copied. */
import { move, transferableSymbol, valueSymbol } from 'piscina'
import { computeRun } from '#server/compute/compute-run.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

export default function answer(inputs: RunInputs) {
  const result = computeRun(inputs)
  if (result.kind !== 'computed') return result
  return move({ [transferableSymbol]: result.bytes.buffer, [valueSymbol]: result })
}
