/** Runs on the server: what the pages read, and the two requests that change something. */
import { keepPreviousData, mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query'
import { api, apiUrl } from '#client/lib/api.ts'
import { designKeys } from '#client/lib/design-keys.ts'
import { limits } from '#shared/limits.ts'
import { decodeColumns } from '#shared/record-codec.ts'
import type { DesignSummary } from '#shared/schemas/design.ts'
import type { Page } from '#shared/schemas/paging.ts'
import type { CreateRun, ListRuns, Run, RunSummary } from '#shared/schemas/run.ts'

export const runQueries = {
  all: () => ['runs'] as const,
  lists: () => [...runQueries.all(), 'list'] as const,
  list: (query: Partial<ListRuns>) =>
    queryOptions({
      queryKey: [...runQueries.lists(), query],
      queryFn: ({ signal }) => api.get<Page<RunSummary>>('/runs', { signal, query }),
      placeholderData: keepPreviousData,
    }),
  detail: (id: number) =>
    queryOptions({
      queryKey: [...runQueries.all(), 'detail', id],
      queryFn: ({ signal }) => api.get<Run>(`/runs/${id}`, { signal }),
    }),
  /** The record's columns, as `run.record.columns` names them. A record never changes once stored. */
  record: (id: number, columns: number) =>
    queryOptions({
      queryKey: [...runQueries.all(), 'record', id, columns],
      queryFn: async ({ signal }) =>
        decodeColumns(await api.bytes(`/runs/${id}/record`, { signal }), columns),
      staleTime: Infinity,
    }),
  /** Designs to filter by. */
  designs: () =>
    queryOptions({
      queryKey: [...runQueries.all(), 'designs'],
      queryFn: ({ signal }) =>
        api.get<Page<DesignSummary>>('/designs', {
          signal,
          query: { sort: 'name', order: 'asc', pageSize: limits.pageSize },
        }),
    }),
}

/** The lists of runs, and those of designs, which count their runs. */
const refreshLists = (client: QueryClient) =>
  Promise.all([
    client.invalidateQueries({ queryKey: runQueries.lists() }),
    client.invalidateQueries({ queryKey: designKeys.lists() }),
  ])

/** A page of the list once the run is gone. */
function without(page: Page<RunSummary> | undefined, id: number): Page<RunSummary> | undefined {
  const items = page?.items.filter((run) => run.id !== id)
  if (!page || !items || items.length === page.items.length) return page
  return { ...page, items, total: page.total - 1 }
}

export const runMutations = {
  save: (client: QueryClient) =>
    mutationOptions({
      mutationFn: ({ body, signal }: { body: CreateRun; signal?: AbortSignal }) =>
        api.post<Run>('/runs', body, { signal }),
      onSuccess: async (run) => {
        client.setQueryData(runQueries.detail(run.id).queryKey, run)
        await refreshLists(client)
      },
    }),
  remove: (client: QueryClient) =>
    mutationOptions({
      mutationFn: (id: number) => api.delete<void>(`/runs/${id}`),
      onSuccess: (_nothing, id) => {
        // The list that is shown next says so at once, and asks again.
        client.setQueriesData<Page<RunSummary>>({ queryKey: runQueries.lists() }, (page) => without(page, id))
        return refreshLists(client)
      },
    }),
}

/** Where the browser fetches a run's record as CSV. */
export const exportUrl = (id: number) => apiUrl(`/runs/${id}/export.csv`)
