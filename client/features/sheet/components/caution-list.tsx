import { cautions, type Caution } from '#client/features/sheet/cautions.ts'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'

export interface CautionListProps {
  live: LiveResult
  circuit: Circuit
  /** A field holds something that is not computed. */
  invalid: boolean
}

const lastValid: Caution = {
  key: 'last-valid',
  sentence: 'A marked field cannot be computed. What is shown and saved are the last valid values.',
}

/** What deserves a second look. */
export function CautionList({ live, circuit, invalid }: CautionListProps) {
  const figures = live.stale ? null : (live.simulation?.figures ?? null)
  const found = [...(invalid ? [lastValid] : []), ...cautions(live.smallSignal, circuit, figures)]
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
