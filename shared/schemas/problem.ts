import { z } from 'zod'

/** An `application/problem+json` answer (RFC 9457) with our two extension members. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  /** Stable word for programs: `invalid`, `signed-out`, `forbidden`, `not-found`, `stale-draft`, … */
  code: z.string(),
  /** Field by field what is wrong with the input; `path` as in the body sent. */
  errors: z
    .array(z.object({ path: z.array(z.union([z.string(), z.number()])), message: z.string() }))
    .optional(),
})

export type Problem = z.infer<typeof problemSchema>
