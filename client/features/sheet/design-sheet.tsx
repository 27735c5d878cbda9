/** The frame of a design: header and pages' tabs, answers first, the circuit card, then the page. */
import { useRef, type ReactNode } from 'react'
import { CautionList } from '#client/features/sheet/components/caution-list.tsx'
import { CircuitCard } from '#client/features/sheet/components/circuit-card.tsx'
import { ConflictDialog } from '#client/features/sheet/components/conflict-dialog.tsx'
import { PageTabs, type SheetPage } from '#client/features/sheet/components/page-tabs.tsx'
import { SheetHeader } from '#client/features/sheet/components/sheet-header.tsx'
import { SheetNotices } from '#client/features/sheet/components/sheet-notices.tsx'
import { VerdictLine } from '#client/features/sheet/components/verdict-line.tsx'
import { VerdictSentence } from '#client/features/sheet/components/verdict-sentence.tsx'
import { EditingContext } from '#client/features/sheet/editing-context.ts'
import type { SheetState } from '#client/features/sheet/hooks/use-sheet.ts'
import { useUndoKeys } from '#client/features/sheet/hooks/use-undo-keys.ts'

export interface DesignSheetProps {
  state: SheetState
  pages: readonly SheetPage[]
  /** Buttons of the header that other features bring. */
  actions: ReactNode
  /** The page itself. */
  children: ReactNode
}

export function DesignSheet({ state, pages, actions, children }: DesignSheetProps) {
  const root = useRef<HTMLDivElement>(null)
  useUndoKeys(root, state.history)
  const { sheet, editing, saving, invalid } = state
  const { design, content, live, readOnly } = sheet
  return (
    <EditingContext value={editing}>
      <div ref={root}>
        <SheetHeader state={state} actions={actions} />
        <PageTabs pages={pages} />
        <div className="grid grid-cols-[minmax(0,1fr)] gap-x-5 gap-y-4 pt-5 lg:grid-cols-[minmax(0,24rem)_minmax(0,1fr)] lg:grid-rows-[auto_1fr] xl:grid-cols-[minmax(0,27rem)_minmax(0,1fr)]">
          <div className="flex flex-col gap-3 lg:col-start-2">
            <SheetNotices {...{ design, readOnly, saving }} />
            <VerdictSentence live={live} circuit={content.circuit} />
            <VerdictLine live={live} />
            <CautionList live={live} circuit={content.circuit} invalid={invalid} />
          </div>
          <div className="lg:col-start-1 lg:row-span-2 lg:row-start-1">
            <CircuitCard live={live} circuit={content.circuit} />
          </div>
          <div className="min-w-0 lg:col-start-2">{children}</div>
        </div>
      </div>
      {saving.status.kind === 'conflict' && (
        <ConflictDialog
          mine={content}
          theirs={saving.status.theirs}
          onKeepMine={saving.keepMine}
          onTakeTheirs={saving.takeTheirs}
        />
      )}
    </EditingContext>
  )
}
