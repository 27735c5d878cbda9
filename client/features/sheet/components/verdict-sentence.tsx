import { verdict, type Phrase, type RecordFacts } from '#client/features/sheet/verdict.ts'
import type { LiveResult } from '#client/lib/live-result.ts'
import { thinSpace } from '#shared/units/format.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'

const marks: Record<NonNullable<Phrase['mark']>, string> = {
  good: 'font-semibold text-ok',
  bad: 'font-semibold text-bad',
  strong: 'font-semibold',
  limit: 'font-semibold text-copper',
}

/** The record's facts, if they belong to the present values. */
function factsOf({ simulation, grid, stale }: LiveResult): RecordFacts | null {
  return simulation && grid && !stale ? { figures: simulation.figures, duration: grid.duration } : null
}

/** A number keeps its unit beside it: the narrow space becomes one that does not break. */
const unbroken = (text: string) => text.replaceAll(thinSpace, '\u202f')

const noAnswer = 'There is no answer for these values. Change one to try again.'

/** The first thing that is read on the sheet; announced when it has changed. */
export function VerdictSentence({ live, circuit }: { live: LiveResult; circuit: Circuit }) {
  const phrases = live.smallSignal
    ? verdict(live.smallSignal, circuit, factsOf(live))
    : [
        {
          text:
            live.failure?.sentence ?? (live.progress === null ? noAnswer : 'Computing whether it starts…'),
        },
      ]
  return (
    <p role="status" className="min-h-[2.7em] text-[1.25rem] leading-[1.35] text-pretty">
      {phrases.map(({ text, mark }, index) =>
        mark ? (
          <b key={index} className={marks[mark]}>
            {unbroken(text)}
          </b>
        ) : (
          <span key={index}>{unbroken(text)}</span>
        ),
      )}
    </p>
  )
}
