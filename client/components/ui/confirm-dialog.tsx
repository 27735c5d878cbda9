/** Asks before something that others will notice. Stays open with the reason when the work fails. */
import type { ReactNode } from 'react'
import { Button } from '#client/components/ui/button.tsx'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { Notice } from '#client/components/ui/notice.tsx'

export interface ConfirmDialogProps {
  title: string
  /** What will happen, and whether it can be undone. */
  children: ReactNode
  /** The verb: "Archive", "Delete run". */
  confirm: string
  danger?: boolean
  busy?: boolean
  /** Why the last try failed. */
  error?: string
  open: boolean
  onOpenChange: (open: boolean) => void
  onConfirm: () => void
}

export function ConfirmDialog(props: ConfirmDialogProps) {
  const {
    title,
    children,
    confirm,
    danger = false,
    busy = false,
    error,
    open,
    onOpenChange,
    onConfirm,
  } = props
  return (
    <Dialog
      title={title}
      description={children}
      open={open}
      onOpenChange={onOpenChange}
      footer={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button variant={danger ? 'danger' : 'main'} busy={busy} onClick={onConfirm}>
            {confirm}
          </Button>
        </>
      }
    >
      {error && <Notice tone="bad">{error}</Notice>}
    </Dialog>
  )
}
