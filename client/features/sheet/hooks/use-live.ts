/** Keeps the figures up with the edits: small signal at once, the record as soon as the engine has it. */
import { useEffect, useMemo, useReducer } from 'react'
import { isAbort, isFailure, useEngine, type RecordResult } from '#client/lib/engine-context.ts'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import type { Failure, SmallSignal } from '#sim/types.ts'

interface LiveState {
  smallSignal: SmallSignal | null
  record: RecordResult | null
  /** What `record`, `failure` and `progress` belong to. */
  recordOf: RunInputs | null
  failedFor: RunInputs | null
  failure: Failure | null
  progress: number | null
}

const nothingYet: LiveState = {
  smallSignal: null,
  record: null,
  recordOf: null,
  failedFor: null,
  failure: null,
  progress: null,
}

const merge = (state: LiveState, change: Partial<LiveState>): LiveState => ({ ...state, ...change })

/** A worker that died, as a failure: data like any other. */
const broken = (error: unknown): Failure => ({
  kind: 'solver',
  path: [],
  sentence: error instanceof Error ? error.message : 'The computation stopped unexpectedly.',
})

/** @param inputs valid inputs; the same object as long as nothing changed */
export function useLive(inputs: RunInputs): LiveResult {
  const engine = useEngine()
  const [state, change] = useReducer(merge, nothingYet)
  const { circuit } = inputs

  useEffect(() => {
    let current = true
    engine.smallSignal(circuit).then(
      (answer) => {
        if (current) change({ smallSignal: isFailure(answer) ? null : answer })
      },
      // The record lane reports the same trouble; without an answer there are no small-signal figures to show.
      () => current && change({ smallSignal: null }),
    )
    return () => void (current = false)
  }, [engine, circuit])

  useEffect(() => {
    let current = true
    change({ progress: 0, failure: null, failedFor: null })
    const ended = (failure: Failure) => change({ failure, failedFor: inputs, progress: null })
    engine.run(inputs, { onProgress: (done) => current && change({ progress: done }) }).then(
      (answer) => {
        // An older record is still the latest one there is: shown, marked as stale, until its successor comes.
        if (!isFailure(answer))
          change({ record: answer, recordOf: inputs, ...(current && { progress: null }) })
        else if (current) ended(answer)
      },
      (error: unknown) => {
        if (current && !isAbort(error)) ended(broken(error))
      },
    )
    return () => void (current = false)
  }, [engine, inputs])

  return useMemo(
    () => ({
      smallSignal: state.smallSignal,
      simulation: state.record?.simulation ?? null,
      grid: state.record?.grid ?? null,
      stale: state.recordOf !== inputs,
      progress: state.progress,
      failure: state.failedFor === inputs ? state.failure : null,
    }),
    [state, inputs],
  )
}
