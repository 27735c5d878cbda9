/** What a quantity input needs to edit one field of the sheet. */
import type { QuantityInputProps } from '#client/components/circuit/quantity-input.tsx'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import { fieldOf, type FieldName, type FieldSpec } from '#client/features/sheet/fields.ts'
import { stepAlong, stepDigit, type SeriesName } from '#shared/units/preferred-series.ts'

/** Significant digits that an arrow key moves in a quantity without preferred values, and finely with Shift. */
const coarseDigits = 2
const fineDigits = 3
/** Finely along a preferred series: one unit of the fourth digit, 0.01 to 0.1 %. */
const finePreferredDigits = 4

function stepper(spec: FieldSpec, series: SeriesName): NonNullable<QuantityInputProps['step']> {
  return (value, direction, fine) => {
    if (!spec.preferred) return stepDigit(value, fine ? fineDigits : coarseDigits, direction)
    return fine || value <= 0
      ? stepDigit(value, finePreferredDigits, direction)
      : stepAlong(series, value, direction)
  }
}

export interface BoundField {
  spec: FieldSpec
  error: string | null
  /** Spread on a `QuantityInput`. */
  input: Pick<
    QuantityInputProps,
    | 'value'
    | 'unit'
    | 'refused'
    | 'invalid'
    | 'onValue'
    | 'onRefuse'
    | 'onLeave'
    | 'step'
    | 'optional'
    | 'readOnly'
  >
}

export function useField(name: FieldName): BoundField {
  const editing = useEditing()
  const spec = fieldOf(name)
  const { value, refused, error } = editing.field(name)
  return {
    spec,
    error,
    input: {
      value,
      unit: spec.unit,
      refused,
      invalid: error !== null,
      optional: spec.clear !== undefined,
      readOnly: editing.readOnly,
      onValue: (next) => editing.setField(name, next),
      onRefuse: (text) => editing.refuseField(name, text),
      onLeave: editing.seal,
      step: stepper(spec, editing.content.series),
    },
  }
}
