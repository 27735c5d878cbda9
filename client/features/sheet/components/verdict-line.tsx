/** Six figures that follow every edit; each label opens its definition. */
import { Popover } from 'radix-ui'
import { Card } from '#client/components/ui/card.tsx'
import { classNames } from '#client/components/ui/class-names.ts'
import { verdictFigures, type VerdictFigure } from '#client/features/sheet/verdict-figures.ts'
import type { LiveResult } from '#client/lib/live-result.ts'

function Definition({ name, definitions }: Pick<VerdictFigure, 'name' | 'definitions'>) {
  return (
    <Popover.Root>
      <Popover.Trigger
        aria-label={`${name}: what it means`}
        className="-mx-1 inline-flex min-h-8 items-center rounded-sm px-1 text-sm text-soft underline decoration-line decoration-dotted underline-offset-4 hover:text-ink"
      >
        {name}
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          sideOffset={4}
          collisionPadding={12}
          aria-label={`${name}, definition`}
          className="z-30 max-w-80 rounded-md border border-line bg-card px-3 py-2.5 text-sm shadow-float"
        >
          <dl className="flex flex-col gap-2">
            {definitions.map((one) => (
              <div key={one.name}>
                <dt className="font-medium">{one.name}</dt>
                <dd className="text-soft">{one.definition}</dd>
              </div>
            ))}
          </dl>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  )
}

function Figure({ name, definitions, parts, stale }: VerdictFigure) {
  return (
    <div className="min-w-0 border-hair px-3.5 pt-1.5 pb-2.5">
      <dt>
        <Definition name={name} definitions={definitions} />
      </dt>
      <dd className={classNames('whitespace-nowrap', stale && 'opacity-60')}>
        <b className="text-[1.4rem] leading-tight font-medium">{parts?.number ?? '–'}</b>
        {parts?.unit && <span className="ml-1 text-sm text-soft">{parts.unit}</span>}
        {stale && parts && <span className="sr-only">, of the values before</span>}
      </dd>
    </div>
  )
}

export function VerdictLine({ live }: { live: LiveResult }) {
  return (
    <Card className="@container">
      <dl
        aria-label="Figures"
        aria-busy={live.progress !== null}
        className="grid grid-cols-2 @md:grid-cols-3 @3xl:grid-cols-6 @3xl:[&>div+div]:border-l"
      >
        {verdictFigures(live).map((one) => (
          <Figure key={one.name} {...one} />
        ))}
      </dl>
      <div className="h-0.5 bg-transparent" aria-hidden>
        {live.progress !== null && (
          <div className="late h-full bg-petrol" style={{ width: `${live.progress * 100}%` }} />
        )}
      </div>
    </Card>
  )
}
