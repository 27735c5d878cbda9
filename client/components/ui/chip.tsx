import type { ReactNode } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'

export type ChipTone = 'plain' | 'petrol' | 'copper' | 'ok' | 'warn' | 'bad'

const tones: Record<ChipTone, string> = {
  plain: 'border-line bg-card text-soft',
  petrol: 'border-transparent bg-petrol-wash text-petrol',
  copper: 'border-transparent bg-copper-wash text-copper',
  ok: 'border-transparent bg-ok-wash text-ok',
  warn: 'border-transparent bg-warn-wash text-warn',
  bad: 'border-transparent bg-bad-wash text-bad',
}

/** A short word about the state of a thing. */
export function Chip({ tone = 'plain', children }: { tone?: ChipTone; children: ReactNode }) {
  return (
    <span
      className={classNames(
        'inline-flex items-center rounded-full border px-2.5 py-0.5 text-sm whitespace-nowrap',
        tones[tone],
      )}
    >
      {children}
    </span>
  )
}
