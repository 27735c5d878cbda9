import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { ConfirmDialog } from '#client/components/ui/confirm-dialog.tsx'
import { runMutations } from '#client/features/runs/queries.ts'
import { problemSentence } from '#client/lib/form-problem.ts'

export interface DeleteRunDialogProps {
  run: { id: number; title: string }
  onDeleted: () => void
}

/** The button and the question before a run is gone for good. */
export function DeleteRunDialog({ run, onDeleted }: DeleteRunDialogProps) {
  const [open, setOpen] = useState(false)
  const queryClient = useQueryClient()
  const remove = useMutation(runMutations.remove(queryClient))
  const confirm = () => {
    if (!remove.isPending) remove.mutate(run.id, { onSuccess: onDeleted })
  }
  return (
    <>
      <Button variant="quiet" className="text-bad hover:bg-bad-wash" onClick={() => setOpen(true)}>
        Delete
      </Button>
      <ConfirmDialog
        title={`Delete “${run.title}”?`}
        confirm="Delete run"
        danger
        busy={remove.isPending}
        error={remove.error ? problemSentence(remove.error) : undefined}
        open={open}
        onOpenChange={setOpen}
        onConfirm={confirm}
      >
        Its record, figures and note are removed for everybody. This cannot be undone; the design stays as it
        is.
      </ConfirmDialog>
    </>
  )
}
