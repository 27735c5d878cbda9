/** Keeps the figures up with the edits: small signal at once, the record as soon as the engine has it. */
import { useEffect, useMemo, useReducer } from 'react'
import { isAbort, isFailure, useEngine, type RecordResult } from '#client/lib/engine-context.ts'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import type { Failure, SmallSignal } from '#sim/types.ts'

interface LiveState {
  smallSignal: SmallSignal | null
  record: RecordResult | null
  /** What `record` and `failure` belong to. */
  recordOf: RunInputs | null
  failedFor: RunInputs | null
  failure: Failure | null
  /** Share done; null while nothing is computed. */
  progress: number | null
  /** Counts what the person asked to compute after having given it up. */
  attempt: number
  /** Ends the computation under way. */
  cancel: () => void
}

const nothingYet: LiveState = {
  smallSignal: null,
  record: null,
  recordOf: null,
  failedFor: null,
  failure: null,
  progress: null,
  attempt: 0,
  cancel: () => undefined,
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
  const { attempt } = state

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
    // An edit does not abort its predecessor: the engine decides whether that one may still finish.
    const controller = new AbortController()
    let current = true
    const ended = (failure: Failure | null) => change({ failure, failedFor: inputs, progress: null })
    const onProgress = (done: number) => {
      if (current && !controller.signal.aborted) change({ progress: done })
    }
    change({ progress: 0, failure: null, failedFor: null, cancel: () => controller.abort() })
    engine.run(inputs, { onProgress, signal: controller.signal }).then(
      (answer) => {
        // An older record is still the latest one there is: shown, marked as stale, until its successor comes.
        if (!isFailure(answer))
          change({ record: answer, recordOf: inputs, ...(current && { progress: null }) })
        else if (current) ended(answer)
      },
      (error: unknown) => {
        if (current) ended(isAbort(error) ? null : broken(error))
      },
    )
    return () => void (current = false)
  }, [engine, inputs, attempt])

  return useMemo(
    () => ({
      smallSignal: state.smallSignal,
      simulation: state.record?.simulation ?? null,
      grid: state.record?.grid ?? null,
      stale: state.recordOf !== inputs,
      progress: state.progress,
      failure: state.failedFor === inputs ? state.failure : null,
      cancel: state.cancel,
      resume: () => change({ attempt: state.attempt + 1 }),
    }),
    [state, inputs],
  )
}
