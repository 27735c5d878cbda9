import { describe, expect, it } from 'vitest'
import { mayDelete } from '#client/features/runs/lib/policy.ts'
import { roles, type Role } from '#shared/roles.ts'

// The rule as the product states it: a run is deleted by its author (an engineer or more) or by an admin.
describe('mayDelete', () => {
  const run = { author: { id: 5, name: 'Author' } }
  const viewer = (id: number, role: Role) => ({ id, role, name: '', email: '' })

  it.each(roles)('answers for a %s who wrote the run and one who did not', (role) => {
    expect(mayDelete(run, viewer(5, role))).toBe(role !== 'technician')
    expect(mayDelete(run, viewer(6, role))).toBe(role === 'admin')
  })
})
