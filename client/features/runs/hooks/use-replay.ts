import { useEffect, useRef, useState } from 'react'
import { replayInputs } from '#client/features/runs/lib/replay-inputs.ts'
import { isAbort, isFailure, useEngine } from '#client/lib/engine-context.ts'
import { compareReplay, type ReplayComparison } from '#shared/replay.ts'
import type { Run } from '#shared/schemas/run.ts'
import type { SettledTone, Simulation } from '#sim/types.ts'

/** What a finished replay found. */
export interface FoundReplay {
  kind: 'compared'
  comparison: ReplayComparison
  engineVersion: string
  tone: SettledTone | null
}

export type ReplayState =
  | { kind: 'idle' }
  /** `done`: share of the record computed, 0…1. */
  | { kind: 'computing'; done: number }
  | { kind: 'failed'; sentence: string }
  | FoundReplay

export interface Replay {
  state: ReplayState
  start: () => void
  cancel: () => void
}

/** The replayed columns in the order in which a run stores them. */
function columnsOf({ vo, v1, v2, control }: Simulation): Float64Array[] {
  return [vo, v1, v2, ...(control ? [control.values] : [])]
}

/** Recomputes a run in this browser and compares it with what is stored. Leaving the page ends the computation. */
export function useReplay(run: Run, columns: readonly Float64Array[]): Replay {
  const engine = useEngine()
  const [state, setState] = useState<ReplayState>({ kind: 'idle' })
  const underWay = useRef<AbortController | null>(null)
  useEffect(() => () => underWay.current?.abort(), [])

  /** Progress travels apart from the answer and may come after it; then it says nothing. */
  const onProgress = (done: number) =>
    setState((current) => (current.kind === 'computing' ? { kind: 'computing', done } : current))

  async function compute(signal: AbortSignal): Promise<ReplayState> {
    const answer = await engine.run(replayInputs(run), { signal, onProgress })
    if (isFailure(answer)) return { kind: 'failed', sentence: answer.sentence }
    const { simulation, engineVersion } = answer
    if (!simulation.figures) {
      const sentence =
        simulation.reason?.sentence ?? 'The computation ended before the whole record was there.'
      return { kind: 'failed', sentence }
    }
    const stored = { figures: run.figures, sampleInterval: run.record.sampleInterval, columns }
    const replayed = {
      figures: simulation.figures,
      sampleInterval: simulation.sampleInterval,
      columns: columnsOf(simulation),
    }
    return {
      kind: 'compared',
      comparison: compareReplay(stored, replayed),
      engineVersion,
      tone: simulation.tone,
    }
  }

  async function start() {
    underWay.current?.abort()
    const controller = new AbortController()
    underWay.current = controller
    setState({ kind: 'computing', done: 0 })
    try {
      const next = await compute(controller.signal)
      if (!controller.signal.aborted) setState(next)
    } catch (error) {
      if (controller.signal.aborted) return
      const sentence = isAbort(error)
        ? 'Another computation took the place of this replay. Start it again.'
        : error instanceof Error
          ? error.message
          : String(error)
      setState({ kind: 'failed', sentence })
    }
  }

  function cancel() {
    underWay.current?.abort()
    setState({ kind: 'idle' })
  }

  return { state, start: () => void start(), cancel }
}
