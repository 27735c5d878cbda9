/** One stored run from its inputs: engine, figures, and the record packed for storage. Runs in the worker thread. */
import { gzipSync } from 'node:zlib'
import type { ComputedRun, Failure } from '#server/compute/computed-run.ts'
import { limits } from '#shared/limits.ts'
import { encodeColumns } from '#shared/record-codec.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import { engineVersion, plan, simulateRun } from '#sim/index.ts'
import type { Simulation } from '#sim/types.ts'

/** zlib level: doubles of a sine hardly compress; level 6 saves a thousandth more than level 1. */
const gzipLevel = 1

/** The columns of a record in the order in which they are stored. */
function columnsOf(simulation: Simulation) {
  const { vo, v1, v2, control } = simulation
  return [
    { name: 'output', unit: 'V', values: vo },
    { name: 'network node', unit: 'V', values: v1 },
    { name: 'series capacitor', unit: 'V', values: v2 },
    ...(control ? [control] : []),
  ]
}

/** The sentence for a record that is too long to be stored, at the field that can mend it. */
function tooLong(inputs: RunInputs, samples: number): Failure | null {
  if (samples <= limits.storedSamples) return null
  const field = inputs.timing.sampleInterval === null ? 'duration' : 'sampleInterval'
  const remedy = field === 'duration' ? 'Shorten the duration' : 'Lengthen the sample interval'
  return {
    kind: 'invalid',
    path: ['timing', field],
    sentence: `A saved run may have at most ${limits.storedSamples} samples, this one would have ${samples}. ${remedy}.`,
  }
}

/**
 * Computes a run for storage. Never throws for bad input or a solver that fails: those come back as data, `path`
 * within the inputs.
 */
export function computeRun(inputs: RunInputs): ComputedRun | Failure {
  const grid = plan(inputs.circuit, inputs.timing, inputs.stimulus)
  if ('kind' in grid) return grid
  const refused = tooLong(inputs, grid.samples)
  if (refused) return refused
  const simulation = simulateRun(inputs)
  if ('kind' in simulation) return simulation
  if (!simulation.figures) {
    const sentence = `The computation ended as ${simulation.status} without figures.`
    return simulation.reason ?? { kind: 'solver', path: [], sentence }
  }
  const columns = columnsOf(simulation)
  return {
    kind: 'computed',
    engineVersion,
    figures: simulation.figures,
    modes: simulation.modes,
    unsettled: simulation.unsettled,
    record: {
      sampleInterval: simulation.sampleInterval,
      samples: simulation.vo.length,
      columns: columns.map(({ name, unit }) => ({ name, unit })),
    },
    // A copy with a buffer of its own: zlib may answer from Node's shared pool, which cannot be transferred.
    bytes: new Uint8Array(
      gzipSync(encodeColumns(columns.map((column) => column.values)), { level: gzipLevel }),
    ),
  }
}
