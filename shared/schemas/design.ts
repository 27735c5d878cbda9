import { z } from 'zod'
import { limits } from '#shared/limits.ts'
import { pagingShape } from '#shared/schemas/paging.ts'
import { draftContentSchema, type DraftContent } from '#shared/schemas/simulation.ts'
import { line } from '#shared/schemas/text.ts'

const id = z.number().int().positive()
const name = line('Name', limits.nameLength)

export const createProjectSchema = z.strictObject({ name })
export const renameProjectSchema = createProjectSchema

export const createDesignSchema = z.strictObject({
  projectId: id,
  name,
  /** Draft to begin with; the server's starting circuit when left out. */
  content: draftContentSchema.optional(),
})

export const changeDesignSchema = z
  .strictObject({ name: name.optional(), archived: z.boolean().optional() })
  .refine((body) => body.name !== undefined || body.archived !== undefined, { error: 'Nothing to change.' })

export const duplicateDesignSchema = z.strictObject({ name: name.optional() })

/** Body of `PUT /api/designs/:id/draft`: `version` is the one that the edit began from. */
export const saveDraftSchema = z.strictObject({
  version: z.number().int().min(1),
  content: draftContentSchema,
})

export const listDesignsSchema = z.strictObject({
  ...pagingShape,
  projectId: z.coerce.number().int().positive().optional(),
  archived: z.enum(['true', 'false']).default('false'),
  sort: z.enum(['name', 'project', 'updatedAt']).default('updatedAt'),
})

export interface Project {
  id: number
  name: string
  designs: number
}

/** A person as others see him or her. */
export interface PersonReference {
  id: number
  name: string
}

export interface DesignSummary {
  id: number
  name: string
  project: { id: number; name: string }
  archived: boolean
  runs: number
  createdBy: PersonReference
  /** Who saved the draft last, and when (ISO 8601). */
  updatedBy: PersonReference
  updatedAt: string
}

export interface Draft {
  version: number
  content: DraftContent
  savedBy: PersonReference
  /** ISO 8601. */
  savedAt: string
}

export interface Design extends DesignSummary {
  draft: Draft
}

export type CreateProject = z.infer<typeof createProjectSchema>
export type CreateDesign = z.infer<typeof createDesignSchema>
export type ChangeDesign = z.infer<typeof changeDesignSchema>
export type SaveDraft = z.infer<typeof saveDraftSchema>
export type ListDesigns = z.infer<typeof listDesignsSchema>
