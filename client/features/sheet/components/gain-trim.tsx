/** Turns feedback R around the critical gain while every figure follows. */
import { Slider } from 'radix-ui'
import type { ReactNode } from 'react'
import { withFeedback } from '#client/features/sheet/amplitude-control.ts'
import { useEditing } from '#client/features/sheet/editing-context.ts'
import { trimRange, type TrimRange } from '#client/features/sheet/trim.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import { formatPercent, formatQuantity } from '#shared/units/format.ts'
import type { SmallSignal } from '#sim/types.ts'

/** Positions of the slider. */
const positions = 1000
/** Feedback R is set to this many significant digits, as a trimmer and a meter can. */
const digits = 5

/** The least share of the travel that two zone names need to stand side by side. */
const roomForTwo = 0.35

const share = (value: number, { least, greatest }: TrimRange) =>
  Math.min(1, Math.max(0, (value - least) / (greatest - least)))

interface Zone {
  from: number
  to: number
  name: string
  className: string
}

function zones(range: TrimRange): Zone[] {
  const critical = share(range.critical, range)
  const mild = range.mild === null ? 1 : share(range.mild, range)
  return [
    { from: 0, to: critical, name: 'dies out', className: 'bg-bad-wash' },
    { from: critical, to: mild, name: range.mild === null ? 'starts' : 'clean', className: 'bg-ok-wash' },
    { from: mild, to: 1, name: 'clips hard', className: 'bg-warn-wash' },
  ].filter((zone) => zone.to > zone.from)
}

/** Zones whose names fit: the middle one's is left out where the last two would meet. */
const namedZones = (range: TrimRange) =>
  zones(range).filter(
    (zone, index, all) => index === 0 || index === all.length - 1 || 1 - zone.from >= roomForTwo,
  )

export interface GainTrimProps {
  /** The last valid one, to which `linear` belongs. */
  circuit: Circuit
  /** Null while there is none. */
  linear: SmallSignal | null
}

export function GainTrim({ circuit, linear }: GainTrimProps) {
  const { readOnly, edit, seal } = useEditing()
  const range = linear && trimRange(circuit, linear)
  if (!linear || !range)
    return (
      <Row>
        <span className="text-soft">{linear ? 'no gain sustains this loop' : 'no answer yet'}</span>
      </Row>
    )
  const width = range.greatest - range.least
  const position = share(circuit.gain.feedbackR, range) * positions
  const margin = formatPercent(linear.gainMargin, { digits: 3, signed: true })
  const set = (next: number) => {
    const feedbackR = Number((range.least + (next / positions) * width).toPrecision(digits))
    edit((before) => withFeedback(before, feedbackR), 'trim')
  }
  return (
    <div>
      <Row>
        <span>
          {formatQuantity(circuit.gain.feedbackR, 'Ω', { digits })}{' '}
          <b className={linear.starts ? 'font-medium text-ok' : 'font-medium text-bad'}>{margin}</b>
        </span>
      </Row>
      <div className="relative pt-4">
        <span
          className="absolute top-0 -translate-x-1/2 text-xs text-copper"
          style={{ left: `${share(range.critical, range) * 100}%` }}
        >
          critical
        </span>
        <Slider.Root
          className="relative flex h-8 touch-none items-center select-none"
          value={[position]}
          max={positions}
          disabled={readOnly}
          onValueChange={([next]) => next !== undefined && set(next)}
          onValueCommit={seal}
        >
          <Slider.Track className="relative h-2 grow overflow-hidden rounded-full bg-sunk">
            {zones(range).map((zone) => (
              <span
                key={zone.name}
                className={`absolute inset-y-0 ${zone.className}`}
                style={{ left: `${zone.from * 100}%`, right: `${(1 - zone.to) * 100}%` }}
              />
            ))}
          </Slider.Track>
          <span
            className="absolute inset-y-0.5 border-l-2 border-copper"
            style={{ left: `${share(range.critical, range) * 100}%` }}
          />
          <Slider.Thumb
            aria-label="Gain trim, feedback R"
            aria-valuetext={`${formatQuantity(circuit.gain.feedbackR, 'Ω', { digits })}, gain margin ${margin}`}
            className="grid size-8 cursor-grab place-items-center rounded-md active:cursor-grabbing"
          >
            <span className="h-5 w-3 rounded-sm bg-petrol" />
          </Slider.Thumb>
        </Slider.Root>
        <div className="relative h-4 text-xs text-soft">
          {namedZones(range).map((zone, index, all) => (
            <span
              key={zone.name}
              className="absolute top-0 whitespace-nowrap"
              style={
                index === all.length - 1 ? { right: 0 } : { left: index === 0 ? 0 : `${zone.from * 100}%` }
              }
            >
              {zone.name}
            </span>
          ))}
        </div>
      </div>
    </div>
  )
}

function Row({ children }: { children: ReactNode }) {
  return (
    <div className="flex items-baseline justify-between gap-3 text-sm">
      <span className="font-medium">Gain trim</span>
      {children}
    </div>
  )
}
