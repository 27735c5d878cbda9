/** Everything the list can do to designs and projects. Each change makes the lists ask again. */
import { useMutation, useQueryClient } from '@tanstack/react-query'
import { projectQueries } from '#client/features/designs/queries.ts'
import { api } from '#client/lib/api.ts'
import { designKeys } from '#client/lib/design-keys.ts'
import type { ChangeDesign, CreateDesign, Design, Project } from '#shared/schemas/design.ts'

function useRefresh() {
  const queryClient = useQueryClient()
  return () =>
    Promise.all([
      queryClient.invalidateQueries({ queryKey: designKeys.all() }),
      queryClient.invalidateQueries({ queryKey: projectQueries.all() }),
    ])
}

/** Where a new design goes: into a project that exists, or into one that is created first. */
export type NewDesign = Omit<CreateDesign, 'projectId'> & { project: { id: number } | { name: string } }

export function useCreateDesign() {
  const refresh = useRefresh()
  return useMutation({
    mutationFn: async ({ project, ...design }: NewDesign) => {
      const { id } = 'id' in project ? project : await api.post<Project>('/projects', { name: project.name })
      return api.post<Design>('/designs', { ...design, projectId: id })
    },
    // Settled, not succeeded: the project may exist although the design was refused.
    onSettled: refresh,
  })
}

export function useChangeDesign(id: number) {
  const refresh = useRefresh()
  return useMutation({
    mutationFn: (change: ChangeDesign) => api.patch<Design>(`/designs/${id}`, change),
    onSuccess: refresh,
  })
}

export function useRenameProject(id: number) {
  const refresh = useRefresh()
  return useMutation({
    mutationFn: (name: string) => api.patch<Project>(`/projects/${id}`, { name }),
    onSuccess: refresh,
  })
}

export function useDuplicateDesign(id: number) {
  const refresh = useRefresh()
  return useMutation({
    mutationFn: (name: string) => api.post<Design>(`/designs/${id}/duplicate`, { name }),
    onSuccess: refresh,
  })
}
