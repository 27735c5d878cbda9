import type { Role } from '#shared/roles.ts'

/**
 * The least role for every action that asks for a signed-in person. The only place that says who may do what; rules
 * that depend on the thing itself (its author) stand in the use case of that thing.
 */
export const policy = {
  'session.read': 'technician',
  'session.end': 'technician',
  'account.changePassword': 'technician',
  'projects.read': 'technician',
  'projects.edit': 'engineer',
  'designs.read': 'technician',
  'designs.edit': 'engineer',
  'runs.read': 'technician',
  'runs.create': 'engineer',
  'runs.delete': 'engineer',
} as const satisfies Record<string, Role>

export type Action = keyof typeof policy
