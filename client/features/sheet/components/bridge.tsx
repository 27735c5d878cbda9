/** The drawing with its inputs. */
import { CircuitDrawing } from '#client/components/circuit/circuit-drawing.tsx'
import { Button } from '#client/components/ui/button.tsx'
import { DrawnField } from '#client/features/sheet/components/drawn-field.tsx'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import { isSingle } from '#client/features/sheet/supply.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'
import { formatQuantity } from '#shared/units/format.ts'

/** A load to begin with, Ω. */
const firstLoad = 2000

function withLoad(content: DraftContent, resistance: number | null): DraftContent {
  const { load: _load, ...circuit } = content.circuit
  return { ...content, circuit: resistance === null ? circuit : { ...circuit, load: { resistance } } }
}

function LoadSlot() {
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
      <DrawnField name="load" label="load" side="right" />
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

export function Bridge() {
  const { circuit } = useEditing().content
  const { supply, amplitudeControl } = circuit
  const { kind } = amplitudeControl
  return (
    <CircuitDrawing
      control={kind}
      loaded={circuit.load !== undefined}
      reference={
        isSingle(supply) ? `reference, ${formatQuantity(supply.negative, 'V')} above the negative rail` : null
      }
      values={{
        seriesR: <DrawnField name="seriesR" label="series R" side="left" />,
        seriesC: <DrawnField name="seriesC" label="series C" side="left" />,
        shuntR: <DrawnField name="shuntR" label="shunt R" side="left" />,
        shuntC: <DrawnField name="shuntC" label="shunt C" side="right" />,
        feedbackR:
          kind === 'diodes' ? (
            <DrawnField name="feedbackSeriesR" label="feedback R" side="right" />
          ) : (
            <DrawnField name="feedbackR" label="feedback R" side="right" />
          ),
        feedbackShuntedR:
          kind === 'diodes' ? (
            <DrawnField name="feedbackShuntedR" label="R ∥ diodes" side="right" />
          ) : undefined,
        groundR: (
          <DrawnField name="groundR" label={kind === 'lamp' ? 'cold lamp' : 'ground R'} side="right" />
        ),
        load: <LoadSlot />,
      }}
    />
  )
}
