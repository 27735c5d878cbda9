import type { Request } from 'express'
import type { z } from 'zod'
import { invalid, notFound } from '#server/http/errors.ts'
import { issuePath } from '#shared/schemas/issue-path.ts'

/** The request's JSON body as `schema` understands it; 422 with a sentence per field otherwise. */
export function readBody<Schema extends z.ZodType>(request: Request, schema: Schema): z.output<Schema> {
  return parse(schema, request.body ?? {})
}

/** The query string as `schema` understands it; 422 with a sentence per parameter otherwise. */
export function readQuery<Schema extends z.ZodType>(request: Request, schema: Schema): z.output<Schema> {
  return parse(schema, request.query)
}

/** The numeric `:id` of the path. Anything else names nothing that exists: 404. */
export function readId(request: Request, what: string): number {
  const { id } = request.params
  if (typeof id === 'string' && /^[1-9]\d{0,14}$/.test(id)) return Number(id)
  throw notFound(what)
}

function parse<Schema extends z.ZodType>(schema: Schema, input: unknown): z.output<Schema> {
  const parsed = schema.safeParse(input)
  if (parsed.success) return parsed.data
  throw invalid(
    parsed.error.issues.map((issue) => ({
      path: issuePath(issue),
      message: issue.message,
    })),
  )
}
