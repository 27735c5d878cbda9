import { cautions } from '#client/features/sheet/cautions.ts'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'

/** What deserves a second look. */
export function CautionList({ live, circuit }: { live: LiveResult; circuit: Circuit }) {
  const figures = live.stale ? null : (live.simulation?.figures ?? null)
  const found = cautions(live.smallSignal, circuit, figures)
  if (found.length === 0) return null
  return (
    <ul aria-label="Cautions" className="flex flex-col gap-1 text-sm">
      {found.map(({ key, sentence }) => (
        <li key={key} className="flex gap-2">
          <span aria-hidden className="w-3 shrink-0 text-center font-semibold text-warn">
            !
          </span>
          {sentence}
        </li>
      ))}
    </ul>
  )
}
