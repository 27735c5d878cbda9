/** The design as its sheet reads and saves it. */
import { queryOptions, type QueryClient } from '@tanstack/react-query'
import { api } from '#client/lib/api.ts'
import { designKeys } from '#client/lib/design-keys.ts'
import type { Design, Draft, SaveDraft } from '#shared/schemas/design.ts'

export const sheetQueries = {
  detail: (id: number) =>
    queryOptions({
      queryKey: designKeys.detail(id),
      queryFn: ({ signal }) => api.get<Design>(`/designs/${id}`, { signal }),
      // A draft that somebody else may have saved meanwhile is worth the request.
      staleTime: 0,
    }),
}

export function saveDraft(designId: number, body: SaveDraft): Promise<Draft> {
  return api.put<Draft>(`/designs/${designId}/draft`, body)
}

/** After a save: this design is known to be as saved, lists of designs are not. */
export function rememberDraft(client: QueryClient, designId: number, draft: Draft): void {
  client.setQueryData(sheetQueries.detail(designId).queryKey, (design) => design && { ...design, draft })
  void client.invalidateQueries({ queryKey: designKeys.lists(), refetchType: 'none' })
}
