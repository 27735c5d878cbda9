/** The circuit, drawn, with everything that can be set about it. */
import { Card } from '#client/components/ui/card.tsx'
import { AmplifierSection } from '#client/features/sheet/components/amplifier-section.tsx'
import { Bridge } from '#client/features/sheet/components/bridge.tsx'
import { CardSection } from '#client/features/sheet/components/card-section.tsx'
import { ControlSection } from '#client/features/sheet/components/control-section.tsx'
import { GainTrim } from '#client/features/sheet/components/gain-trim.tsx'
import { GainWords } from '#client/features/sheet/components/gain-words.tsx'
import { GangRow } from '#client/features/sheet/components/gang-row.tsx'
import { PowerOnSection } from '#client/features/sheet/components/power-on-section.tsx'
import { RecordSection } from '#client/features/sheet/components/record-section.tsx'
import { SupplySection } from '#client/features/sheet/components/supply-section.tsx'
import type { LiveResult } from '#client/lib/live-result.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'

export interface CircuitCardProps {
  live: LiveResult
  /** The last valid one, to which `live` belongs; the inputs themselves show what was typed. */
  circuit: Circuit
}

export function CircuitCard({ live, circuit }: CircuitCardProps) {
  return (
    <Card role="group" aria-label="Circuit">
      <div className="py-3">
        <Bridge />
      </div>
      <CardSection title="Gain">
        <GainTrim circuit={circuit} linear={live.smallSignal} />
        <GainWords gain={circuit.gain} />
      </CardSection>
      <CardSection title="Network">
        <GangRow />
      </CardSection>
      <ControlSection />
      <AmplifierSection />
      <SupplySection />
      <PowerOnSection />
      <RecordSection grid={live.stale ? null : live.grid} />
    </Card>
  )
}
