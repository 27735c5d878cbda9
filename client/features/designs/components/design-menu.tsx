/** What can be done to one design of the list. */
import { useState } from 'react'
import { Menu, MenuItem } from '#client/components/ui/menu.tsx'
import { ArchiveDialog } from '#client/features/designs/components/archive-dialog.tsx'
import { DuplicateDialog } from '#client/features/designs/components/duplicate-dialog.tsx'
import { RenameDialog } from '#client/features/designs/components/rename-dialog.tsx'
import type { DesignSummary } from '#shared/schemas/design.ts'

type Action = 'rename' | 'duplicate' | 'archive'

export function DesignMenu({ design }: { design: DesignSummary }) {
  const [action, setAction] = useState<Action | null>(null)
  const dialog = (name: Action) => ({
    design,
    open: action === name,
    onOpenChange: (open: boolean) => setAction(open ? name : null),
  })
  return (
    <>
      <Menu
        trigger={
          <button
            type="button"
            aria-label={`Actions for ${design.name}`}
            className="inline-grid size-8 place-items-center rounded-md text-soft hover:bg-sunk hover:text-ink data-[state=open]:bg-sunk"
          >
            <svg aria-hidden viewBox="0 0 16 16" className="size-4" fill="currentColor">
              <circle cx="3" cy="8" r="1.4" />
              <circle cx="8" cy="8" r="1.4" />
              <circle cx="13" cy="8" r="1.4" />
            </svg>
          </button>
        }
      >
        {!design.archived && <MenuItem onSelect={() => setAction('rename')}>Rename…</MenuItem>}
        <MenuItem onSelect={() => setAction('duplicate')}>Duplicate…</MenuItem>
        <MenuItem onSelect={() => setAction('archive')}>{design.archived ? 'Restore…' : 'Archive…'}</MenuItem>
      </Menu>
      <RenameDialog {...dialog('rename')} />
      <DuplicateDialog {...dialog('duplicate')} />
      <ArchiveDialog {...dialog('archive')} />
    </>
  )
}
