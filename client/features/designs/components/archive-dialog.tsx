import { ConfirmDialog } from '#client/components/ui/confirm-dialog.tsx'
import { useStatus } from '#client/components/ui/status.tsx'
import { useChangeDesign } from '#client/features/designs/hooks/use-design-changes.ts'
import { problemSentence } from '#client/lib/form-problem.ts'
import type { DesignSummary } from '#shared/schemas/design.ts'

export interface DesignDialogProps {
  design: DesignSummary
  open: boolean
  onOpenChange: (open: boolean) => void
}

/** Archives a current design or restores an archived one. */
export function ArchiveDialog({ design, open, onOpenChange }: DesignDialogProps) {
  const change = useChangeDesign(design.id)
  const say = useStatus()
  const { archived, name } = design

  const confirm = () =>
    change.mutate(
      { archived: !archived },
      {
        onSuccess: () => {
          onOpenChange(false)
          say(archived ? `“${name}” is current again.` : `“${name}” is archived.`)
        },
      },
    )

  return (
    <ConfirmDialog
      title={archived ? 'Restore this design?' : 'Archive this design?'}
      confirm={archived ? 'Restore' : 'Archive'}
      busy={change.isPending}
      error={change.isError ? problemSentence(change.error) : undefined}
      open={open}
      onOpenChange={(next) => {
        change.reset()
        onOpenChange(next)
      }}
      onConfirm={confirm}
    >
      {archived
        ? `“${name}” returns to the current designs and can be edited again.`
        : `“${name}” leaves the current designs and can no longer be edited. Its runs stay, and it can be restored at any time.`}
    </ConfirmDialog>
  )
}
