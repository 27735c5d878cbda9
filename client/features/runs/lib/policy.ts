import { roleIncludes } from '#shared/roles.ts'
import type { Person } from '#shared/schemas/account.ts'
import type { RunSummary } from '#shared/schemas/run.ts'

/** Whether the interface offers to delete a run: its author while still an engineer, and admins. The server decides. */
export function mayDelete(run: Pick<RunSummary, 'author'>, viewer: Person): boolean {
  if (viewer.role === 'admin') return true
  return roleIncludes(viewer.role, 'engineer') && run.author.id === viewer.id
}
