/** Server state of the list of designs and of the projects. */
import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import { api } from '#client/lib/api.ts'
import { designKeys } from '#client/lib/design-keys.ts'
import type { DesignSummary, ListDesigns, Project } from '#shared/schemas/design.ts'
import type { Page } from '#shared/schemas/paging.ts'

export const designQueries = {
  list: (params: ListDesigns) =>
    queryOptions({
      queryKey: [...designKeys.lists(), params],
      queryFn: ({ signal }) => api.get<Page<DesignSummary>>('/designs', { signal, query: { ...params } }),
      placeholderData: keepPreviousData,
    }),
}

export const projectQueries = {
  all: () => ['projects'] as const,
  list: () =>
    queryOptions({
      queryKey: projectQueries.all(),
      queryFn: async ({ signal }) => (await api.get<{ items: Project[] }>('/projects', { signal })).items,
    }),
}
