import { Button } from '#client/components/ui/button.tsx'
import { Chip, type ChipTone } from '#client/components/ui/chip.tsx'
import type { DraftSaving } from '#client/features/sheet/hooks/use-autosave.ts'
import { formatAge } from '#client/lib/dates.ts'
import type { SaveStatus } from '#client/features/sheet/autosave.ts'

function words(status: SaveStatus, kept: boolean, invalid: boolean): { tone: ChipTone; text: string } {
  switch (status.kind) {
    case 'saved':
      return invalid
        ? { tone: 'warn', text: 'not saved: mend the marked field' }
        : { tone: 'plain', text: `draft, saved ${formatAge(status.at)}` }
    case 'unsaved':
      return { tone: 'plain', text: 'unsaved changes' }
    case 'saving':
      return { tone: 'plain', text: 'saving…' }
    case 'offline':
      return kept
        ? { tone: 'warn', text: 'offline: kept in this browser, tried again by itself' }
        : { tone: 'bad', text: 'offline: not saved anywhere yet, keep this page open' }
    case 'refused':
      return { tone: 'bad', text: `not saved: ${status.sentence}` }
    case 'conflict':
      return { tone: 'bad', text: `not saved: ${status.theirs.savedBy.name} saved meanwhile` }
  }
}

/** Whether the draft is safe. */
export function SavedChip({ saving, invalid }: { saving: DraftSaving; invalid: boolean }) {
  const { tone, text } = words(saving.status, saving.kept, invalid)
  const again = saving.status.kind === 'offline' || saving.status.kind === 'refused'
  return (
    <span role="status" className="inline-flex max-w-full flex-wrap items-center gap-1">
      <Chip tone={tone}>{text}</Chip>
      {again && (
        <Button variant="quiet" onClick={saving.retry}>
          Try now
        </Button>
      )}
    </span>
  )
}
