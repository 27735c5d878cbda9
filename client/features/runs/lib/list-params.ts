/** The state of the list of runs as the address holds it, so that a link shows the same list. */
import { listRunsSchema, type ListRuns } from '#shared/schemas/run.ts'

/** Runs picked for comparison, two at most. */
const pickKey = 'pick'

/** The query that the address asks for; what it gets wrong falls back to the usual one, field by field. */
export function readListQuery(params: URLSearchParams): ListRuns {
  const usual = listRunsSchema.parse({})
  const { shape } = listRunsSchema
  const entries = Object.entries(shape).map(([key, schema]) => {
    const parsed = schema.safeParse(params.get(key) ?? undefined)
    return [key, parsed.success ? parsed.data : usual[key as keyof ListRuns]]
  })
  return Object.fromEntries(entries) as ListRuns
}

/** The address after a change; any change but of the page itself begins again at page 1, usual values are left out. */
export function changeListQuery(params: URLSearchParams, changes: Partial<ListRuns>): URLSearchParams {
  const usual = listRunsSchema.parse({})
  const next = new URLSearchParams(params)
  if (!('page' in changes)) next.delete('page')
  for (const [key, value] of Object.entries(changes))
    if (value === undefined || value === '' || value === usual[key as keyof ListRuns]) next.delete(key)
    else next.set(key, String(value))
  return next
}

/** Identifiers of the runs picked, in the order in which they were picked. */
export function readPicked(params: URLSearchParams): number[] {
  return (params.get(pickKey) ?? '')
    .split(',')
    .filter((text) => /^[1-9]\d*$/.test(text))
    .slice(0, 2)
    .map(Number)
}

/** Picks or drops a run; a third one takes the second's place. */
export function togglePicked(params: URLSearchParams, id: number): URLSearchParams {
  const picked = readPicked(params)
  const next = new URLSearchParams(params)
  const kept = picked.includes(id) ? picked.filter((other) => other !== id) : [...picked.slice(0, 1), id]
  if (kept.length > 0) next.set(pickKey, kept.join(','))
  else next.delete(pickKey)
  return next
}
