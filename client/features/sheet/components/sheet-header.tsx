import type { ReactNode } from 'react'
import { PageHeader } from '#client/components/ui/page-header.tsx'
import { SavedChip } from '#client/features/sheet/components/saved-chip.tsx'
import { UndoButtons } from '#client/features/sheet/components/undo-buttons.tsx'
import type { SheetState } from '#client/features/sheet/hooks/use-sheet.ts'

/** Which design this is, whether it is saved, and what can be done with it. */
export function SheetHeader({ state, actions }: { state: SheetState; actions: ReactNode }) {
  const { sheet, saving, history, invalid } = state
  const { design, readOnly } = sheet
  return (
    <PageHeader
      over={design.project.name}
      title={design.name}
      chips={!readOnly && <SavedChip saving={saving} invalid={invalid} />}
      actions={
        !readOnly && (
          <>
            <UndoButtons {...history} />
            {actions}
          </>
        )
      }
    />
  )
}
