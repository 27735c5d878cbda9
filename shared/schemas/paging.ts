import { z } from 'zod'
import { limits } from '#shared/limits.ts'
import { isPlainText } from '#shared/schemas/text.ts'

/** Query parameters that every list takes. Pages count from 1. */
export const pagingShape = {
  search: z
    .string()
    .trim()
    .max(limits.nameLength, { error: `A search may have at most ${limits.nameLength} characters.` })
    .refine(isPlainText, { error: 'A search may not contain control characters.' })
    .default(''),
  order: z.enum(['asc', 'desc']).default('desc'),
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(limits.pageSize).default(20),
}

export interface Page<Item> {
  items: Item[]
  /** Matching items over all pages. */
  total: number
  page: number
  pageSize: number
}
