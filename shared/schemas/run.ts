import { z } from 'zod'
import type { Figures } from '#shared/figures.ts'
import { limits } from '#shared/limits.ts'
import type { PersonReference } from '#shared/schemas/design.ts'
import { pagingShape } from '#shared/schemas/paging.ts'
import { runInputsSchema, type RunInputs } from '#shared/schemas/simulation.ts'
import { line } from '#shared/schemas/text.ts'

/** Body of `POST /api/runs`. Inputs only: the server computes record and figures itself, they are evidence. */
export const createRunSchema = z.strictObject({
  designId: z.number().int().positive(),
  title: line('Title', limits.titleLength),
  note: z
    .string()
    .trim()
    .max(limits.noteLength, { error: `A note may have at most ${limits.noteLength} characters.` })
    .default(''),
  inputs: runInputsSchema,
})

export const listRunsSchema = z.strictObject({
  ...pagingShape,
  designId: z.coerce.number().int().positive().optional(),
  authorId: z.coerce.number().int().positive().optional(),
  sort: z.enum(['title', 'design', 'author', 'createdAt']).default('createdAt'),
})

/**
 * What governs the output during a span, seconds from power-on: the loop, the slew limit, or a rail. The engine's words
 * are these.
 */
export interface RunModeSpan {
  mode: 'linear' | 'slewUp' | 'slewDown' | 'heldHigh' | 'heldLow'
  start: number
  end: number
}

export interface RunSummary {
  id: number
  title: string
  note: string
  design: { id: number; name: string }
  project: { id: number; name: string }
  author: PersonReference
  /** ISO 8601. */
  createdAt: string
  engineVersion: string
  figures: Figures
}

/** The stored record's columns, in order; see `record-codec.ts` for the bytes. */
export interface RecordLayout {
  sampleInterval: number
  samples: number
  columns: { name: string; unit: string }[]
}

export interface Run extends RunSummary {
  inputs: RunInputs
  record: RecordLayout
  modes: RunModeSpan[]
  /** Why the settled figures are missing; null when they are there. */
  unsettled: string | null
}

export type CreateRun = z.infer<typeof createRunSchema>
export type ListRuns = z.infer<typeof listRunsSchema>
