/** A number typed in engineering notation. Wrong text stays as it was typed; arrow keys step the value. */
import { useState, type ComponentProps, type KeyboardEvent } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'
import { useFieldControl } from '#client/components/ui/field.tsx'
import { inputClasses } from '#client/components/ui/inputs.ts'
import { formatInput, formatQuantity } from '#shared/units/format.ts'
import { parseQuantity } from '#shared/units/parse.ts'

/** Text that could not be read, and why. */
export interface RefusedText {
  text: string
  sentence: string
}

export interface QuantityInputProps extends Omit<
  ComponentProps<'input'>,
  'value' | 'onChange' | 'onKeyDown' | 'onBlur' | 'step'
> {
  /** SI; null shows an empty field. */
  value: number | null
  unit: string
  /** The text of a field whose last typing was refused. */
  refused?: RefusedText | null
  invalid?: boolean
  /** Null when an `optional` field was emptied. */
  onValue: (value: number | null) => void
  onRefuse: (refused: RefusedText) => void
  /** The field was left, or Enter pressed: what is typed next is another step. */
  onLeave?: () => void
  /** Next value on an arrow key; `fine` with Shift. */
  step?: (value: number, direction: 1 | -1, fine: boolean) => number
  optional?: boolean
  /** Without the unit, where space is short and a symbol beside it tells. */
  compact?: boolean
}

/** Digits that a field shows: enough for any tolerance, few enough to be read. */
const digits = 6

function write(value: number | null, unit: string, compact: boolean): string {
  if (value === null) return ''
  return compact ? formatInput(value, digits) : formatQuantity(value, unit, { digits })
}

/** Equal but for the rounding of derived values (a total of two rails). */
const same = (a: number, b: number) => Math.abs(a - b) <= 1e-12 * Math.max(Math.abs(a), Math.abs(b))

export function QuantityInput({
  value,
  unit,
  refused,
  invalid,
  onValue,
  onRefuse,
  onLeave,
  step,
  optional,
  compact = false,
  className,
  readOnly,
  ...rest
}: QuantityInputProps) {
  const control = useFieldControl()
  const [typed, setTyped] = useState<string | null>(null)

  /** Whether the text being typed still says what the field holds; undo or the other side of a gang may change it. */
  function holds(text: string): boolean {
    if (refused) return refused.text === text
    if (text.trim() === '') return value === null
    const parsed = parseQuantity(text, unit)
    return parsed.ok && value !== null && same(parsed.value, value)
  }

  function read(text: string) {
    setTyped(text)
    if (optional && text.trim() === '') return onValue(null)
    const parsed = parseQuantity(text, unit)
    if (parsed.ok) onValue(parsed.value)
    else onRefuse({ text, sentence: parsed.sentence })
  }

  function leave() {
    setTyped(null)
    onLeave?.()
  }

  function keyDown(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === 'Enter') leave()
    if ((event.key !== 'ArrowUp' && event.key !== 'ArrowDown') || !step || readOnly) return
    event.preventDefault()
    if (value === null || refused) return
    setTyped(null)
    onValue(step(value, event.key === 'ArrowUp' ? 1 : -1, event.shiftKey))
  }

  const shown = typed !== null && holds(typed) ? typed : (refused?.text ?? write(value, unit, compact))
  return (
    <input
      {...control}
      {...rest}
      type="text"
      inputMode="text"
      autoComplete="off"
      autoCapitalize="off"
      spellCheck={false}
      readOnly={readOnly}
      value={shown}
      aria-invalid={invalid || control['aria-invalid'] || undefined}
      onChange={(event) => read(event.target.value)}
      onKeyDown={keyDown}
      onBlur={leave}
      className={classNames(inputClasses, className)}
    />
  )
}
