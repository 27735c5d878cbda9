import { useStatus } from '#client/components/ui/status.tsx'
import type { DesignDialogProps } from '#client/features/designs/components/archive-dialog.tsx'
import { NameDialog } from '#client/features/designs/components/name-dialog.tsx'
import { useChangeDesign } from '#client/features/designs/hooks/use-design-changes.ts'

/** Gives a design another name. */
export function RenameDialog({ design, open, onOpenChange }: DesignDialogProps) {
  const change = useChangeDesign(design.id)
  const say = useStatus()
  return (
    <NameDialog
      title="Rename design"
      initial={design.name}
      confirm="Rename"
      open={open}
      onOpenChange={onOpenChange}
      onName={async (name) => {
        await change.mutateAsync({ name })
        onOpenChange(false)
        say(`Renamed to “${name}”.`)
      }}
    />
  )
}
