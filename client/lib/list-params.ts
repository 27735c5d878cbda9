/** A list's search, filters, sort and page live in the address: what I see is what my reviewer opens. */
import { useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'
import type { z } from 'zod'

type ListSchema = z.ZodObject

/** Parses what the address says; what it says wrongly falls back to the schema's default. */
export function parseListParams<Schema extends ListSchema>(
  schema: Schema,
  search: URLSearchParams,
): z.output<Schema> {
  const stated = [...search].filter(([key, value]) => key in schema.shape && value !== '')
  const first = schema.safeParse(Object.fromEntries(stated))
  if (first.success) return first.data
  const wrong = new Set(first.error.issues.map((issue) => issue.path[0]))
  return schema.parse(Object.fromEntries(stated.filter(([key]) => !wrong.has(key))))
}

/** The address of changed parameters; defaults are left out of it. */
export function writeListParams<Schema extends ListSchema>(
  schema: Schema,
  params: z.output<Schema>,
): URLSearchParams {
  const defaults = schema.parse({}) as Record<string, unknown>
  const search = new URLSearchParams()
  for (const [key, value] of Object.entries(params))
    if (value !== undefined && value !== defaults[key]) search.set(key, String(value))
  return search
}

/** The parameters and a way to change some; any change but of the page goes back to page 1. */
export function useListParams<Schema extends ListSchema>(schema: Schema) {
  const [search, setSearch] = useSearchParams()
  const params = useMemo(() => parseListParams(schema, search), [schema, search])
  const change = (part: Partial<z.output<Schema>>) =>
    setSearch((now) => writeListParams(schema, { ...parseListParams(schema, now), page: 1, ...part }), {
      replace: !('page' in part),
    })
  return [params, change] as const
}
