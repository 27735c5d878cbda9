import type { Role } from '#shared/roles.ts'

/** What each role may do beyond reading, in a phrase. */
export const roleMeaning: Record<Role, string> = {
  technician: 'reads designs and runs, replays and exports them',
  engineer: 'creates and edits designs, saves runs',
  reviewer: 'does what an engineer does, and reviews',
  admin: 'does everything, and deletes runs of others',
}
