/** Start-up: does it start, how fast, and what stops the growth? */
import { useMemo } from 'react'
import { limitSpans } from '#client/components/charts/limit-spans.ts'
import { RecordFrame } from '#client/components/charts/record-frame.tsx'
import { CloseUpCard } from '#client/features/start-up/components/close-up-card.tsx'
import { GrowthCard } from '#client/features/start-up/components/growth-card.tsx'
import { OutputPlot } from '#client/features/start-up/components/output-plot.tsx'
import { PolesCard } from '#client/features/start-up/components/poles-card.tsx'
import { SharesCard } from '#client/features/start-up/components/shares-card.tsx'
import { useLiveView } from '#client/features/start-up/hooks/use-live-view.ts'
import { closeUp } from '#client/features/start-up/lib/close-up.ts'
import { growthStory } from '#client/features/start-up/lib/growth-story.ts'
import { modeShares } from '#client/features/start-up/lib/mode-shares.ts'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { AmplitudeControl, Circuit } from '#shared/schemas/circuit.ts'
import type { Simulation, SmallSignal } from '#sim/types.ts'

export interface StartUpPageProps {
  circuit: Circuit
  live: LiveResult
}

interface StartUpRecordProps {
  control: AmplitudeControl['kind']
  reference: number | undefined
  smallSignal: SmallSignal | null
  simulation: Simulation
}

function StartUpRecord({ control, reference, smallSignal, simulation }: StartUpRecordProps) {
  const { figures, sampleInterval } = simulation
  const end = (simulation.vo.length - 1) * sampleInterval
  const { view, setView, cursors, setCursors } = useLiveView(end, sampleInterval)
  const spans = useMemo(() => limitSpans(simulation.modes), [simulation.modes])
  const shares = useMemo(() => modeShares(simulation), [simulation])
  const near = useMemo(() => closeUp(figures, end), [figures, end])
  return (
    <div className="space-y-4">
      <OutputPlot
        {...{ simulation, reference, spans, view, cursors }}
        onViewChange={setView}
        onCursorsChange={setCursors}
      />
      <div className="grid gap-4 xl:grid-cols-2">
        {smallSignal && <GrowthCard story={growthStory({ control, smallSignal, simulation })} />}
        <SharesCard shares={shares} />
        {near && (
          <CloseUpCard closeUp={near} {...{ simulation, spans, cursors }} onCursorsChange={setCursors} />
        )}
        {smallSignal && <PolesCard smallSignal={smallSignal} />}
      </div>
    </div>
  )
}

export function StartUpPage({ circuit, live }: StartUpPageProps) {
  return (
    <RecordFrame live={live}>
      {(simulation) => (
        <StartUpRecord
          control={circuit.amplitudeControl.kind}
          reference={circuit.supply.reference}
          simulation={simulation}
          smallSignal={live.smallSignal}
        />
      )}
    </RecordFrame>
  )
}
