import { useState } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { useStatus } from '#client/components/ui/status.tsx'
import { NameDialog } from '#client/features/designs/components/name-dialog.tsx'
import { useRenameProject } from '#client/features/designs/hooks/use-design-changes.ts'
import type { Project } from '#shared/schemas/design.ts'

/** The button beside the filter by project, and the dialog that asks for the project's new name. */
export function RenameProject({ project }: { project: Project }) {
  const [open, setOpen] = useState(false)
  const rename = useRenameProject(project.id)
  const say = useStatus()
  return (
    <>
      <Button variant="quiet" className="justify-self-start" onClick={() => setOpen(true)}>
        Rename project…
      </Button>
      <NameDialog
        title="Rename project"
        initial={project.name}
        confirm="Rename"
        open={open}
        onOpenChange={setOpen}
        onName={async (name) => {
          await rename.mutateAsync(name)
          setOpen(false)
          say(`The project is now “${name}”.`)
        }}
      />
    </>
  )
}
