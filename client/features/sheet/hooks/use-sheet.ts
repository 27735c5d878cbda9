/** Everything a design sheet holds: the draft being edited, what is computed from it, and how it is saved. */
import { useCallback, useMemo, useReducer } from 'react'
import type { RefusedText } from '#client/components/circuit/quantity-input.tsx'
import { beginDraft, draftReducer, refusals } from '#client/features/sheet/draft-state.ts'
import { fieldError, fieldOf, type FieldName } from '#client/features/sheet/fields.ts'
import { useAutosave, type DraftSaving } from '#client/features/sheet/hooks/use-autosave.ts'
import { useLive } from '#client/features/sheet/hooks/use-live.ts'
import type { Change, Sheet } from '#client/features/sheet/sheet.ts'
import { useIncludesRole } from '#client/lib/session.ts'
import type { Design } from '#shared/schemas/design.ts'
import type { DraftContent, RunInputs } from '#shared/schemas/simulation.ts'

/** One field as its input needs it. */
export interface FieldState {
  value: number | null
  /** Text that could not be read, to be shown as it was typed. */
  refused: RefusedText | null
  error: string | null
}

/** How the circuit card reads and changes the draft. */
export interface SheetEditing {
  /** What the fields show; it may break the schema's rules. */
  content: DraftContent
  readOnly: boolean
  edit: (change: Change, step?: string) => void
  field: (name: FieldName) => FieldState
  setField: (name: FieldName, value: number | null) => void
  refuseField: (name: FieldName, text: RefusedText) => void
  /** Ends the undo step that is being typed or dragged. */
  seal: () => void
}

export interface UndoState {
  undo: () => void
  redo: () => void
  canUndo: boolean
  canRedo: boolean
}

export interface SheetState {
  sheet: Sheet
  editing: SheetEditing
  history: UndoState
  saving: DraftSaving
  /** Fields hold something that is not computed or saved. */
  invalid: boolean
}

export function useSheet(design: Design): SheetState {
  const readOnly = !useIncludesRole('engineer') || design.archived
  const [state, dispatch] = useReducer(draftReducer, design.draft.content, beginDraft)
  const { content, refused } = state.history.present
  const { circuit, stimulus, timing } = state.valid

  const inputs = useMemo<RunInputs>(() => ({ circuit, stimulus, timing }), [circuit, stimulus, timing])
  const live = useLive(inputs)
  const show = useCallback(
    (next: DraftContent, how: 'replace' | 'reset') => dispatch({ type: how, content: next }),
    [],
  )
  const saving = useAutosave({ design, content: state.valid, readOnly, show })

  const edit = useCallback(
    (change: Change, step?: string) => {
      if (!readOnly) dispatch({ type: 'edit', change, step: step ?? null })
    },
    [readOnly],
  )

  const sentences = useMemo(() => {
    const found = new Map(refusals(content))
    // What the engine alone can refuse, such as a duration of a million periods, belongs at its field as well.
    if (found.size === 0 && live.failure?.kind === 'invalid')
      found.set(live.failure.path.join('.'), live.failure.sentence)
    return found
  }, [content, live.failure])

  const editing = useMemo<SheetEditing>(
    () => ({
      content,
      readOnly,
      edit,
      field(name) {
        const spec = fieldOf(name)
        const text = refused[spec.key] ?? null
        return {
          value: spec.read(content),
          refused: text,
          error: text?.sentence ?? fieldError(spec, content, sentences),
        }
      },
      setField(name, value) {
        const spec = fieldOf(name)
        const change: Change = (before) =>
          value === null ? (spec.clear?.(before) ?? before) : spec.write(before, value)
        dispatch({ type: 'edit', change, step: spec.key, field: spec.key })
      },
      refuseField: (name, text) => dispatch({ type: 'refuse', field: fieldOf(name).key, text }),
      seal: () => dispatch({ type: 'seal' }),
    }),
    [content, refused, sentences, readOnly, edit],
  )

  const history = useMemo<UndoState>(
    () => ({
      undo: () => dispatch({ type: 'undo' }),
      redo: () => dispatch({ type: 'redo' }),
      canUndo: state.history.past.length > 0,
      canRedo: state.history.future.length > 0,
    }),
    [state.history],
  )

  const sheet = useMemo<Sheet>(
    () => ({ design, content: state.valid, edit, live, readOnly }),
    [design, state.valid, edit, live, readOnly],
  )
  const invalid = content !== state.valid || Object.keys(refused).length > 0
  return { sheet, editing, history, saving, invalid }
}
