import { useNavigate } from 'react-router-dom'
import { useStatus } from '#client/components/ui/status.tsx'
import type { DesignDialogProps } from '#client/features/designs/components/archive-dialog.tsx'
import { NameDialog } from '#client/features/designs/components/name-dialog.tsx'
import { useDuplicateDesign } from '#client/features/designs/hooks/use-design-changes.ts'
import { limits } from '#shared/limits.ts'

/** Copies a design within its project and opens the copy. */
export function DuplicateDialog({ design, open, onOpenChange }: DesignDialogProps) {
  const duplicate = useDuplicateDesign(design.id)
  const navigate = useNavigate()
  const say = useStatus()
  return (
    <NameDialog
      title="Duplicate design"
      description={`The copy takes the draft as it stands into ${design.project.name}. Runs stay with the original.`}
      initial={`Copy of ${design.name}`.slice(0, limits.nameLength)}
      confirm="Duplicate"
      open={open}
      onOpenChange={onOpenChange}
      onName={async (name) => {
        const copy = await duplicate.mutateAsync(name)
        onOpenChange(false)
        say(`“${copy.name}” created.`)
        await navigate(`/designs/${copy.id}/start-up`)
      }}
    />
  )
}
