/** What the engine's worker does. Failures leave it as data, whatever happened inside. */
import { releaseProxy, transfer, type Remote } from 'comlink'
import type { RecordResult } from '#client/lib/engine-context.ts'
import type { EngineService } from '#client/workers/engine-connection.ts'
import { engineVersion, plan, simulateRun, smallSignal, type Failure, type Simulation } from '#sim/index.ts'

/** A fault of the engine itself, not of the inputs. */
function fault(error: unknown): Failure {
  const reason = error instanceof Error ? error.message : String(error)
  return { kind: 'solver', path: [], sentence: `The engine failed on these values: ${reason}` }
}

/** Every buffer of a record: moved to the page, not copied. */
function buffersOf({ vo, v1, v2, control, envelope, tone }: Simulation): ArrayBuffer[] {
  const columns = [
    vo,
    v1,
    v2,
    control?.values,
    envelope.time,
    envelope.value,
    tone?.waveform.vo,
    tone?.waveform.v1,
  ]
  return [...new Set(columns.flatMap((column) => (column ? [column.buffer as ArrayBuffer] : [])))]
}

export const engineService: EngineService = {
  smallSignal(circuit) {
    try {
      return smallSignal(circuit)
    } catch (error) {
      return fault(error)
    }
  },
  run(inputs, onProgress) {
    try {
      const simulation = simulateRun(inputs, { onProgress })
      if ('sentence' in simulation) return simulation
      if (simulation.status !== 'complete') return simulation.reason ?? fault('it stopped early')
      const grid = plan(inputs.circuit, inputs.timing, inputs.stimulus)
      if ('sentence' in grid) return grid
      const result: RecordResult = { simulation, grid, engineVersion }
      return transfer(result, buffersOf(simulation))
    } catch (error) {
      return fault(error)
    } finally {
      // The page hands in a proxy of its callback, which holds a port open until it is released.
      ;(onProgress as Remote<NonNullable<typeof onProgress>> | undefined)?.[releaseProxy]?.()
    }
  },
}
