import { Button } from '#client/components/ui/button.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { comparePath } from '#client/features/runs/lib/pick.ts'
import type { RunSummary } from '#shared/schemas/run.ts'

/** What is picked for comparison, and the way there. */
export function PickBar({ picked, onClear }: { picked: readonly RunSummary[]; onClear: () => void }) {
  const [a, b] = picked
  return (
    <div className="flex min-h-13 flex-wrap items-center gap-x-4 gap-y-2 border-b border-hair px-4 py-2">
      <p role="status" className="min-w-0 grow text-soft wrap-anywhere">
        {!a && 'Tick two runs to compare them in one plot.'}
        {a && !b && (
          <>
            <b className="font-medium text-ink">{a.title}</b> is picked. Tick one more.
          </>
        )}
        {a && b && (
          <>
            <b className="font-medium text-ink">{a.title}</b> and{' '}
            <b className="font-medium text-ink">{b.title}</b> are picked.
          </>
        )}
      </p>
      {a && (
        <div className="flex gap-2">
          <Button variant="quiet" onClick={onClear}>
            Clear
          </Button>
          {b && (
            <LinkButton variant="main" to={comparePath(a.id, b.id)}>
              Compare
            </LinkButton>
          )}
        </div>
      )}
    </div>
  )
}
