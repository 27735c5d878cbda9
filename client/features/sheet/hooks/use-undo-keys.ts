import { useEffect, type RefObject } from 'react'
import type { UndoState } from '#client/features/sheet/hooks/use-sheet.ts'

/**
 * Ctrl or Cmd with Z undoes, with Shift+Z or Y redoes, anywhere in the sheet. Fields of dialogs over the page keep
 * their own undo.
 */
export function useUndoKeys(root: RefObject<HTMLElement | null>, { undo, redo }: UndoState): void {
  useEffect(() => {
    function onKeyDown(event: KeyboardEvent) {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return
      const key = event.key.toLowerCase()
      if (key !== 'z' && key !== 'y') return
      const target = event.target as Node
      if (target !== document.body && !root.current?.contains(target)) return
      event.preventDefault()
      if (key === 'y' || event.shiftKey) redo()
      else undo()
    }
    addEventListener('keydown', onKeyDown)
    return () => removeEventListener('keydown', onKeyDown)
  }, [root, undo, redo])
}
