/** The draft being edited: what was typed, what of it is valid, and the way back. */
import type { RefusedText } from '#client/components/circuit/quantity-input.tsx'
import type { Change } from '#client/features/sheet/sheet.ts'
import * as history from '#client/features/sheet/history.ts'
import { draftContentSchema, type DraftContent } from '#shared/schemas/simulation.ts'

/** What the fields show. `content` may break the schema's rules; fields with refused text keep their last number. */
export interface Working {
  content: DraftContent
  refused: Readonly<Record<string, RefusedText>>
}

export interface DraftState {
  history: history.History<Working>
  /** The latest content that the schema accepts: computed, drawn and saved. */
  valid: DraftContent
}

export type DraftAction =
  | {
      type: 'edit'
      change: Change
      /** Changes in a row with the same step are undone together; null stands by itself. */
      step: string | null
      /** Field whose refused text this replaces. */
      field?: string
    }
  | { type: 'refuse'; field: string; text: RefusedText }
  | { type: 'seal' | 'undo' | 'redo' }
  /** Content from elsewhere, as an undo step: a restored copy, the other side of a conflict. */
  | { type: 'replace'; content: DraftContent }
  /** Content from elsewhere as a new beginning. */
  | { type: 'reset'; content: DraftContent }

export function beginDraft(content: DraftContent): DraftState {
  return { history: history.begin<Working>({ content, refused: {} }), valid: content }
}

/** What the schema refuses: sentence by dotted path, the first of each path. */
export function refusals(content: DraftContent): ReadonlyMap<string, string> {
  const parsed = draftContentSchema.safeParse(content)
  const found = new Map<string, string>()
  for (const issue of parsed.error?.issues ?? []) {
    const path = issue.path.join('.')
    if (!found.has(path)) found.set(path, issue.message)
  }
  return found
}

function without(refused: Working['refused'], field: string | undefined): Working['refused'] {
  if (field === undefined || !(field in refused)) return refused
  const { [field]: _replaced, ...rest } = refused
  return rest
}

function moved(state: DraftState, next: history.History<Working>): DraftState {
  if (next === state.history) return state
  const { content } = next.present
  const accepted = content === state.valid || draftContentSchema.safeParse(content).success
  return { history: next, valid: accepted ? content : state.valid }
}

export function draftReducer(state: DraftState, action: DraftAction): DraftState {
  const { present } = state.history
  switch (action.type) {
    case 'edit': {
      const content = action.change(present.content)
      const refused = without(present.refused, action.field)
      if (content === present.content && refused === present.refused) return state
      return moved(state, history.advance(state.history, { content, refused }, action.step))
    }
    case 'refuse': {
      // The 4 on the way to a refused 4q7 was read as a value: the circuit goes back to before the typing.
      const typing = state.history.step === action.field
      const { content } = (typing && state.history.past.at(-1)) || present
      const refused = { ...present.refused, [action.field]: action.text }
      return moved(state, history.advance(state.history, { content, refused }, action.field))
    }
    case 'seal':
      return moved(state, history.seal(state.history))
    case 'undo':
      return moved(state, history.undo(state.history))
    case 'redo':
      return moved(state, history.redo(state.history))
    case 'replace':
      return moved(state, history.advance(state.history, { content: action.content, refused: {} }, null))
    case 'reset':
      return beginDraft(action.content)
  }
}
