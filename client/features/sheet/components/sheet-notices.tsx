/** What the person should know before editing: no permission, edits of an earlier visit. */
import { Button } from '#client/components/ui/button.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import type { DraftSaving } from '#client/features/sheet/hooks/use-autosave.ts'
import { formatMoment } from '#client/lib/dates.ts'
import type { Design } from '#shared/schemas/design.ts'

export interface SheetNoticesProps {
  design: Design
  readOnly: boolean
  saving: DraftSaving
}

export function SheetNotices({ design, readOnly, saving }: SheetNoticesProps) {
  const { copy } = saving
  return (
    <>
      {readOnly && (
        <Notice tone="info">
          {design.archived
            ? 'This design is archived: it can be read but not edited.'
            : 'You may read this design. Editing it needs the role of an engineer.'}
        </Notice>
      )}
      {copy && (
        <Notice
          tone="warn"
          title="Edits of an earlier visit were not saved"
          action={
            <span className="flex flex-wrap gap-2">
              <Button onClick={saving.discardCopy}>Discard</Button>
              <Button variant="main" onClick={saving.restoreCopy}>
                Bring them back
              </Button>
            </span>
          }
        >
          This browser kept them on {formatMoment(copy.at)}.
        </Notice>
      )}
    </>
  )
}
