import type { LiveResult } from '#client/lib/live-result.ts'
import type { Design } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

/** A change of the draft. Return the next content; never alter the one that is handed in. */
export type Change = (content: DraftContent) => DraftContent

/** What the pages of a design sheet share: the outlet context of `app/routes/design-sheet.tsx`. */
export interface Sheet {
  design: Design
  /** The latest valid content: what is computed, saved and drawn. */
  content: DraftContent
  /**
   * Applies a change as one undo step. Changes in a row with the same `step` name make one step together (a slider
   * being dragged, a value being typed).
   */
  edit: (change: Change, step?: string) => void
  live: LiveResult
  /** True for those who may look but not edit. */
  readOnly: boolean
}
