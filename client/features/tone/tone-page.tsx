/** Tone: what comes out once it has settled? */
import { RecordFrame } from '#client/components/charts/record-frame.tsx'
import { EmptyState } from '#client/components/ui/empty-state.tsx'
import { FiguresCard } from '#client/features/tone/components/figures-card.tsx'
import { HarmonicsCard } from '#client/features/tone/components/harmonics-card.tsx'
import { PeriodCard } from '#client/features/tone/components/period-card.tsx'
import { noTone } from '#client/features/tone/lib/no-tone.ts'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { Simulation, SmallSignal } from '#sim/types.ts'

export interface TonePageProps {
  live: LiveResult
}

function ToneRecord({
  simulation,
  smallSignal,
}: {
  simulation: Simulation
  smallSignal: SmallSignal | null
}) {
  const { figures, tone } = simulation
  if (!figures || !tone) {
    const { title, sentence } = noTone(smallSignal, simulation)
    return <EmptyState title={title}>{sentence}</EmptyState>
  }
  return (
    <div className="space-y-4">
      <FiguresCard figures={figures} />
      <PeriodCard tone={tone} />
      <HarmonicsCard tone={tone} />
    </div>
  )
}

export function TonePage({ live }: TonePageProps) {
  return (
    <RecordFrame live={live}>
      {(simulation) => <ToneRecord simulation={simulation} smallSignal={live.smallSignal} />}
    </RecordFrame>
  )
}
