import { useEffect, useState } from 'react'
import { useSearchParams } from 'react-router-dom'
import { readViewState, writeViewState, type ViewState } from '#client/lib/view-params.ts'

/** Quiet time before the address follows, ms: browsers refuse a page that rewrites its address too often. */
const settleTime = 300

/**
 * The view of a waveform page, begun from the address and written back to it once it rests.
 * @param start first instant of the record, s
 * @param end last instant of the record, s
 */
export function useViewParams(start: number, end: number) {
  const [params, setParams] = useSearchParams()
  const [state, setState] = useState<ViewState>(() => readViewState(params, [start, end]))

  useEffect(() => {
    const next = writeViewState(params, state, [start, end])
    if (next.toString() === params.toString()) return
    const timer = setTimeout(() => setParams(next, { replace: true, preventScrollReset: true }), settleTime)
    return () => clearTimeout(timer)
  }, [params, setParams, state, start, end])

  const change = (changes: Partial<ViewState>) => setState((current) => ({ ...current, ...changes }))
  return [state, change] as const
}
