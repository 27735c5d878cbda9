/** The four roles, least first. They are cumulative: each may do all that the ones before it may. */
export const roles = ['technician', 'engineer', 'reviewer', 'admin'] as const
export type Role = (typeof roles)[number]

/** Whether `role` includes everything that `needed` may do. */
export function roleIncludes(role: Role, needed: Role): boolean {
  return roles.indexOf(role) >= roles.indexOf(needed)
}
