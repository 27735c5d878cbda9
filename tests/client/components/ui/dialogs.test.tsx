import { render, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import { Button } from '#client/components/ui/button.tsx'
import { ConfirmDialog } from '#client/components/ui/confirm-dialog.tsx'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { Menu, MenuItem } from '#client/components/ui/menu.tsx'
import { StatusProvider, useStatus } from '#client/components/ui/status.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'

function Opener({ stay = false }: { stay?: boolean }) {
  const [open, setOpen] = useState(false)
  return (
    <>
      <Button onClick={() => setOpen(true)}>Open</Button>
      <Dialog title="Save run" open={open} onOpenChange={setOpen} stay={stay} footer={<Button>Save</Button>}>
        <TextInput aria-label="Title" />
      </Dialog>
    </>
  )
}

describe('Dialog', () => {
  it('takes focus to its first field, keeps it, and gives it back on Escape', async () => {
    const user = userEvent.setup()
    render(<Opener />)
    const opener = screen.getByRole('button', { name: 'Open' })
    await user.click(opener)
    const field = screen.getByRole('textbox', { name: 'Title' })
    expect(field).toHaveFocus()
    const stops = []
    for (let i = 0; i < 3; i++) {
      await user.tab()
      stops.push(document.activeElement?.textContent)
    }
    expect(stops).toEqual(['Save', 'Close', ''])
    expect(field).toHaveFocus()
    await user.keyboard('{Escape}')
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
    await waitFor(() => expect(opener).toHaveFocus())
  })

  it('stays where nothing sensible lies behind it', async () => {
    const user = userEvent.setup()
    render(<Opener stay />)
    await user.click(screen.getByRole('button', { name: 'Open' }))
    await user.keyboard('{Escape}')
    expect(screen.getByRole('dialog', { name: 'Save run' })).toBeInTheDocument()
    expect(screen.queryByRole('button', { name: 'Close' })).not.toBeInTheDocument()
  })
})

describe('ConfirmDialog', () => {
  it('begins at Cancel, so that Enter alone destroys nothing', async () => {
    const [confirm, change] = [vi.fn(), vi.fn()]
    const user = userEvent.setup()
    render(
      <ConfirmDialog
        title="Delete this run?"
        confirm="Delete"
        danger
        open
        onOpenChange={change}
        onConfirm={confirm}
      >
        It cannot be restored.
      </ConfirmDialog>,
    )
    expect(screen.getByRole('dialog')).toHaveAccessibleDescription('It cannot be restored.')
    await user.keyboard('{Enter}')
    expect(change).toHaveBeenCalledWith(false)
    expect(confirm).not.toHaveBeenCalled()
    await user.click(screen.getByRole('button', { name: 'Delete' }))
    expect(confirm).toHaveBeenCalledTimes(1)
  })
})

describe('Menu', () => {
  it('opens, moves and chooses by keyboard', async () => {
    const [rename, archive] = [vi.fn(), vi.fn()]
    const user = userEvent.setup()
    render(
      <Menu trigger={<Button>Actions</Button>}>
        <MenuItem onSelect={rename}>Rename</MenuItem>
        <MenuItem onSelect={archive}>Archive</MenuItem>
      </Menu>,
    )
    await user.tab()
    await user.keyboard('{ArrowDown}')
    expect(screen.getByRole('menuitem', { name: 'Rename' })).toHaveFocus()
    await user.keyboard('{ArrowDown}{Enter}')
    expect(archive).toHaveBeenCalledTimes(1)
    expect(rename).not.toHaveBeenCalled()
    await waitFor(() => expect(screen.getByRole('button', { name: 'Actions' })).toHaveFocus())
  })
})

describe('Status', () => {
  function Sayer() {
    const say = useStatus()
    return <Button onClick={() => say('Run saved.')}>Save</Button>
  }

  it('announces politely in a region that was there before', async () => {
    render(
      <StatusProvider>
        <Sayer />
      </StatusProvider>,
    )
    const region = screen.getByRole('status')
    expect(region).toBeEmptyDOMElement()
    await userEvent.click(screen.getByRole('button', { name: 'Save' }))
    expect(region).toHaveTextContent('Run saved.')
  })
})
