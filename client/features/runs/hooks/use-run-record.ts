import { useQuery } from '@tanstack/react-query'
import { runQueries } from '#client/features/runs/queries.ts'
import type { Run } from '#shared/schemas/run.ts'

export interface RunRecord {
  run: Run | undefined
  /** One column for each of `run.record.columns`, from power-on. */
  columns: Float64Array[] | undefined
  error: Error | null
  retry: () => void
}

/** A saved run and its stored record: the columns follow once the run says how many there are. */
export function useRunRecord(runId: number): RunRecord {
  const run = useQuery(runQueries.detail(runId))
  const count = run.data?.record.columns.length ?? 0
  const record = useQuery({ ...runQueries.record(runId, count), enabled: count > 0 })
  return {
    run: run.data,
    columns: record.data,
    error: run.error ?? record.error,
    retry: () => void (run.error ? run.refetch() : record.refetch()),
  }
}
