/** How the time divides among loop, rails and slew rate: one bar, with its parts in words. */
import { Card } from '#client/components/ui/card.tsx'
import { classNames } from '#client/components/ui/class-names.ts'
import type { ModeShares } from '#client/features/start-up/lib/mode-shares.ts'
import { formatPercent } from '#shared/units/format.ts'
import type { Mode } from '#sim/types.ts'

/** Below this a share is a brief event, and more digits of it say nothing. */
const leastShare = 1e-4
const inWords = (share: number) =>
  share < leastShare ? `under ${formatPercent(leastShare)}` : formatPercent(share, { digits: 3 })

const parts: { mode: Mode; name: string; fill: string }[] = [
  { mode: 'heldHigh', name: 'held at the upper rail', fill: 'bg-copper' },
  { mode: 'slewDown', name: 'slewing down', fill: 'bg-slate' },
  { mode: 'linear', name: 'no limit, the loop governs', fill: 'bg-petrol/30' },
  { mode: 'slewUp', name: 'slewing up', fill: 'bg-slate/60' },
  { mode: 'heldLow', name: 'held at the lower rail', fill: 'bg-copper/60' },
]

export function SharesCard({ shares: { of, shares } }: { shares: ModeShares }) {
  const met = parts.filter(({ mode }) => shares[mode] > 0)
  return (
    <Card className="px-4 py-3">
      <h2 className="text-base font-medium">
        {of === 'settled' ? 'What governs a settled period' : 'What governs the output over this record'}
      </h2>
      <div className="mt-3 flex h-4 gap-px overflow-hidden rounded" aria-hidden="true">
        {met.map(({ mode, fill }) => (
          <div key={mode} className={classNames('min-w-px', fill)} style={{ flexGrow: shares[mode] }} />
        ))}
      </div>
      <dl className="mt-3 space-y-1">
        {met.map(({ mode, name, fill }) => (
          <div key={mode} className="flex items-center gap-2">
            <dt className="flex items-center gap-2 text-soft">
              <span aria-hidden="true" className={classNames('size-3 rounded-xs', fill)} />
              {name}
            </dt>
            <dd className="ml-auto font-medium">{inWords(shares[mode])}</dd>
          </div>
        ))}
      </dl>
    </Card>
  )
}
