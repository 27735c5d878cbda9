/**
 * Where designs stand in the cache, from general to specific: the list, the sheet and the runs, which count towards a
 * design, all make one another's answers ask again.
 */
export const designKeys = {
  all: () => ['designs'] as const,
  lists: () => [...designKeys.all(), 'list'] as const,
  detail: (id: number) => [...designKeys.all(), 'detail', id] as const,
}
