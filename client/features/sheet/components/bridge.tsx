/** The drawing with its inputs, and under it what is wrong with them. */
import { useId, type ReactNode } from 'react'
import { CircuitDrawing, type CircuitSlot } from '#client/components/circuit/circuit-drawing.tsx'
import { Button } from '#client/components/ui/button.tsx'
import type { ControlKind } from '#client/features/sheet/amplitude-control.ts'
import { DrawnErrors } from '#client/features/sheet/components/drawn-errors.tsx'
import { DrawnField, type DrawnFieldProps } from '#client/features/sheet/components/drawn-field.tsx'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import type { FieldName } from '#client/features/sheet/fields.ts'
import { isSingle } from '#client/features/sheet/supply.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'
import { formatQuantity } from '#shared/units/format.ts'

/** A load to begin with, Ω. */
const firstLoad = 2000

function withLoad(content: DraftContent, resistance: number | null): DraftContent {
  const { load: _load, ...circuit } = content.circuit
  return { ...content, circuit: resistance === null ? circuit : { ...circuit, load: { resistance } } }
}

function LoadSlot({ part }: { part: DrawnFieldProps }) {
  const { content, readOnly, edit } = useEditing()
  if (content.circuit.load === undefined)
    return readOnly ? null : (
      <Button
        variant="quiet"
        className="mt-3 px-1.5! text-sm"
        onClick={() => edit((before) => withLoad(before, firstLoad))}
      >
        Add load
      </Button>
    )
  return (
    <>
      <DrawnField {...part} />
      {!readOnly && (
        <Button
          variant="quiet"
          aria-label="Remove load"
          className="absolute -top-2.5 right-0 size-8 px-0! text-soft!"
          onClick={() => edit((before) => withLoad(before, null))}
        >
          ×
        </Button>
      )}
    </>
  )
}

/** The parts that the drawing shows for a kind of amplitude control, by their places. */
function partsOf(kind: ControlKind, id: string) {
  const part = (name: FieldName, label: string, side: DrawnFieldProps['side']): DrawnFieldProps => ({
    name,
    label,
    side,
    errorId: `${id}-${name}`,
  })
  return {
    seriesR: part('seriesR', 'series R', 'left'),
    seriesC: part('seriesC', 'series C', 'left'),
    shuntR: part('shuntR', 'shunt R', 'left'),
    shuntC: part('shuntC', 'shunt C', 'right'),
    feedbackR: part(kind === 'diodes' ? 'feedbackSeriesR' : 'feedbackR', 'feedback R', 'right'),
    ...(kind === 'diodes' && { feedbackShuntedR: part('feedbackShuntedR', 'R ∥ diodes', 'right') }),
    groundR: part('groundR', kind === 'lamp' ? 'cold lamp' : 'ground R', 'right'),
    load: part('load', 'load', 'right'),
  }
}

export function Bridge() {
  const id = useId()
  const { circuit } = useEditing().content
  const { supply, amplitudeControl } = circuit
  const { load, ...parts } = partsOf(amplitudeControl.kind, id)
  const inputs: Partial<Record<CircuitSlot, ReactNode>> = Object.fromEntries(
    Object.entries(parts).map(([slot, part]) => [slot, <DrawnField key={part.name} {...part} />]),
  )
  return (
    <>
      <CircuitDrawing
        control={amplitudeControl.kind}
        loaded={circuit.load !== undefined}
        reference={
          isSingle(supply)
            ? `reference, ${formatQuantity(supply.negative, 'V')} above the negative rail`
            : null
        }
        values={{ ...inputs, load: <LoadSlot part={load} /> }}
      />
      <DrawnErrors parts={[...Object.values(parts), load]} />
    </>
  )
}
