import { memo } from 'react'
import { CircuitDrawing, type CircuitDrawingProps } from '#client/components/circuit/circuit-drawing.tsx'
import { DrawnValue } from '#client/components/circuit/drawn-value.tsx'
import { Card } from '#client/components/ui/card.tsx'
import { limitSentences } from '#client/features/runs/lib/limit-sentences.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { RunModeSpan } from '#shared/schemas/run.ts'
import { formatQuantity } from '#shared/units/format.ts'

function slots({ network, gain, amplitudeControl: control, load }: Circuit): CircuitDrawingProps['values'] {
  const ohms = (label: string, value: number) => (
    <DrawnValue label={label} value={formatQuantity(value, 'Ω')} />
  )
  const farads = (label: string, value: number) => (
    <DrawnValue label={label} value={formatQuantity(value, 'F')} />
  )
  const diodes = control.kind === 'diodes' ? control : null
  return {
    seriesR: ohms('series R', network.seriesR),
    seriesC: farads('series C', network.seriesC),
    shuntR: ohms('shunt R', network.shuntR),
    shuntC: farads('shunt C', network.shuntC),
    feedbackR: ohms(diodes ? 'feedback R, series' : 'feedback R', diodes?.seriesR ?? gain.feedbackR),
    feedbackShuntedR: diodes && ohms('across the diodes', diodes.shuntedR),
    groundR: ohms(control.kind === 'lamp' ? 'lamp, cold' : 'ground R', gain.groundR),
    load: load && ohms('load', load.resistance),
  }
}

export interface RunCircuitProps {
  circuit: Circuit
  /** What governs the output at the playhead. */
  limit: RunModeSpan['mode']
}

/** The circuit of a run with its values, and what limits it at the instant of the playhead. */
export const RunCircuit = memo(function RunCircuit({ circuit, limit }: RunCircuitProps) {
  const { reference } = circuit.supply
  return (
    <Card className="break-inside-avoid overflow-x-auto pt-2">
      <CircuitDrawing
        values={slots(circuit)}
        control={circuit.amplitudeControl.kind}
        loaded={circuit.load !== undefined}
        reference={reference === undefined ? null : `reference, ${formatQuantity(reference, 'V')}`}
        limit={limit}
      />
      <p className="border-t border-hair px-4 py-2 text-sm text-soft">
        At the playhead:{' '}
        <span className={limit === 'linear' ? undefined : 'text-copper'}>{limitSentences[limit]}</span>
      </p>
    </Card>
  )
})
