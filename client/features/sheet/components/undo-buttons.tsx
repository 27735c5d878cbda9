import { Button } from '#client/components/ui/button.tsx'
import type { UndoState } from '#client/features/sheet/hooks/use-sheet.ts'

/** The way back over the edits of this visit, and forth again. */
export function UndoButtons({ undo, redo, canUndo, canRedo }: UndoState) {
  return (
    <>
      <Button variant="quiet" onClick={undo} disabled={!canUndo} title="Ctrl+Z">
        Undo
      </Button>
      <Button variant="quiet" onClick={redo} disabled={!canRedo} title="Ctrl+Shift+Z">
        Redo
      </Button>
    </>
  )
}
