/** The unsaved draft kept in this browser, so that a crash, a closed tab or a lost server costs nothing. */
import { z } from 'zod'
import { draftContentSchema, type DraftContent } from '#shared/schemas/simulation.ts'

const draftCopySchema = z.object({
  /** Version on the server that the edits began from. */
  version: z.number().int(),
  /** ISO 8601. */
  at: z.string(),
  content: draftContentSchema,
})

export type DraftCopy = z.infer<typeof draftCopySchema>

/** One copy per person and design; a shared bench computer shows nobody another one's edits. */
const key = (personId: number, designId: number) => `sinewright.draft.${personId}.${designId}`

export interface DraftCopies {
  /** The copy, or null: a text that is none any more (another release wrote it) counts as none. */
  read(): DraftCopy | null
  /** Whether it was kept: the browser's storage may be full or forbidden. */
  keep(version: number, content: DraftContent): boolean
  forget(): void
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return null
  }
}

export function draftCopies(personId: number, designId: number, storage: Storage): DraftCopies {
  const name = key(personId, designId)
  return {
    read() {
      const parsed = draftCopySchema.safeParse(parse(storage.getItem(name) ?? 'null'))
      return parsed.success ? parsed.data : null
    },
    keep(version, content) {
      try {
        storage.setItem(name, JSON.stringify({ version, at: new Date().toISOString(), content }))
        return true
      } catch {
        return false
      }
    },
    forget: () => storage.removeItem(name),
  }
}

/** Whether two contents are the same values. */
export function sameContent(a: DraftContent, b: DraftContent): boolean {
  return canonical(a) === canonical(b)
}

function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) =>
    inner !== null && typeof inner === 'object' && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  )
}
