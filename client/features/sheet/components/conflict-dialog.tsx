/** Two people, or two tabs, edited one draft: both sides, and a choice. */
import { Button } from '#client/components/ui/button.tsx'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { differences } from '#client/features/sheet/differences.ts'
import { formatMoment } from '#client/lib/dates.ts'
import type { Draft } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

export interface ConflictDialogProps {
  mine: DraftContent
  theirs: Draft
  onKeepMine: () => void
  onTakeTheirs: () => void
}

export function ConflictDialog({ mine, theirs, onKeepMine, onTakeTheirs }: ConflictDialogProps) {
  const rows = differences(mine, theirs.content)
  const who = theirs.savedBy.name
  return (
    <Dialog
      title="This draft was saved elsewhere"
      description={`${who} saved it on ${formatMoment(theirs.savedAt)}, after you had begun to edit. Nothing is overwritten until you choose.`}
      open
      stay
      onOpenChange={() => undefined}
      footer={
        <>
          <Button onClick={onTakeTheirs}>Take theirs</Button>
          <Button variant="main" onClick={onKeepMine}>
            Keep mine, save over
          </Button>
        </>
      }
    >
      {rows.length === 0 ? (
        <p>Both sides hold the same values.</p>
      ) : (
        <table
          // Takes the focus, so that a key still being typed presses no button.
          tabIndex={0}
          className="w-full text-sm"
        >
          <thead>
            <tr className="border-b border-line text-left text-soft">
              <th className="py-1.5 pr-3 font-medium">Value</th>
              <th className="py-1.5 pr-3 font-medium">Mine</th>
              <th className="py-1.5 font-medium">Theirs</th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row.label} className="border-b border-hair align-top">
                <th scope="row" className="py-1.5 pr-3 text-left font-normal">
                  {row.label}
                </th>
                <td className="py-1.5 pr-3 font-medium">{row.mine}</td>
                <td className="py-1.5 font-medium">{row.theirs}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className="mt-3 text-sm text-soft">After taking theirs, Undo brings your values back.</p>
    </Dialog>
  )
}
