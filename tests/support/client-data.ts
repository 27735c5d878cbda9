/** Invented answers of the server for component tests. */
import type { Role } from '#shared/roles.ts'
import type { Session } from '#shared/schemas/account.ts'
import type { Design, DesignSummary, Project } from '#shared/schemas/design.ts'
import type { Page } from '#shared/schemas/paging.ts'
import { startingDraft } from '#shared/starting-draft.ts'

export function aSession(role: Role = 'engineer', more: Partial<Session> = {}): Session {
  return {
    person: { id: 1, name: 'Edda Holm', email: `${role}@brackwater.example`, role },
    csrfToken: 'token-1',
    mode: 'demo',
    ...more,
  }
}

export const exciterProject: Project = { id: 1, name: 'Salinity probe exciter', designs: 2 }

export function aDesign(more: Partial<DesignSummary> = {}): DesignSummary {
  return {
    id: 7,
    name: '1 kHz exciter, bare',
    project: { id: exciterProject.id, name: exciterProject.name },
    archived: false,
    runs: 3,
    createdBy: { id: 1, name: 'Edda Holm' },
    updatedBy: { id: 2, name: 'Ruben Achterberg' },
    updatedAt: '2026-03-12T09:30:00.000Z',
    ...more,
  }
}

export function aFullDesign(more: Partial<DesignSummary> = {}): Design {
  const summary = aDesign(more)
  const { updatedBy: savedBy, updatedAt: savedAt } = summary
  return { ...summary, draft: { version: 1, content: startingDraft, savedBy, savedAt } }
}

export function aPage<Item>(items: Item[], more: Partial<Page<Item>> = {}): Page<Item> {
  return { items, total: items.length, page: 1, pageSize: 20, ...more }
}
