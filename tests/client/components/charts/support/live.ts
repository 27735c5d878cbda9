/** Live results for pages, computed by the engine itself. */
import type { LiveResult } from '#client/lib/live-result.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import { simulate, smallSignal, type Simulation } from '#sim/index.ts'

/** s. */
const sampleInterval = 10e-6

/** The starting circuit with another feedback R (Ω), over `duration` s from a kick that keeps the start short. */
export function computed(feedbackR: number, duration: number): LiveResult & { simulation: Simulation } {
  const circuit = { ...startingDraft.circuit, gain: { ...startingDraft.circuit.gain, feedbackR } }
  const simulation = simulate(circuit, { stimulus: { kind: 'kick', voltage: 1 }, duration, sampleInterval })
  return {
    smallSignal: smallSignal(circuit),
    simulation,
    grid: { duration, sampleInterval },
    stale: false,
    progress: null,
    failure: null,
  }
}

export const nothingYet: LiveResult = {
  smallSignal: null,
  simulation: null,
  grid: null,
  stale: true,
  progress: 0.42,
  failure: null,
}
