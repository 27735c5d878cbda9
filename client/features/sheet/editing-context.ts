import { createContext, useContext } from 'react'
import type { SheetEditing } from '#client/features/sheet/hooks/use-sheet.ts'

export const EditingContext = createContext<SheetEditing | null>(null)

/** The draft as the parts of the circuit card edit it. Throws outside a design sheet. */
export function useEditing(): SheetEditing {
  const editing = useContext(EditingContext)
  if (!editing) throw new Error('useEditing needs an EditingContext above it')
  return editing
}
