/**
 * The oscillator drawn as a bridge: RC arm at the left, gain arm at the right, the amplifier between. The labels of the
 * parts are slots, so that a sheet puts inputs there and a replay its values. What limits turns copper, with a word.
 * The drawing keeps its size and stays in the middle; wider cards give the outer labels more room.
 */
import type { ReactNode } from 'react'
import { classNames } from '#client/components/ui/class-names.ts'
import {
  Capacitor,
  Diode,
  Earth,
  Joint,
  Lamp,
  LyingResistor,
  Resistor,
  Word,
} from '#client/components/circuit/drawing-parts.tsx'
import type { AmplitudeControl } from '#shared/schemas/circuit.ts'
import type { Mode } from '#sim/types.ts'

/** Places beside the parts. `feedbackShuntedR` only with diodes, `load` only with a load or a way to add one. */
export type CircuitSlot =
  'seriesR' | 'seriesC' | 'shuntR' | 'shuntC' | 'feedbackR' | 'feedbackShuntedR' | 'groundR' | 'load'

export interface CircuitDrawingProps {
  /** What stands beside each part: an input with its label, or a `DrawnValue`. */
  values: Partial<Record<CircuitSlot, ReactNode>>
  control: AmplitudeControl['kind']
  /** Whether a load hangs at the output. */
  loaded?: boolean
  /** On a single supply: the words for the reference that both arms end at. Earth otherwise. */
  reference?: string | null
  /** What governs the output now; null or `linear` draws nothing. */
  limit?: Mode | null
}

/** The word for each limit. */
export const limitWords: Record<Exclude<Mode, 'linear'>, string> = {
  heldHigh: 'held at + rail',
  heldLow: 'held at − rail',
  slewUp: 'slewing up',
  slewDown: 'slewing down',
}

/** Width and height of the drawing, px; the narrowest card of a 360 px screen is 326 px wide. */
const width = 326
const height = 424
/** Columns of wires, px from the left. */
const at = { shuntR: 88, series: 108, shuntC: 128, amplifier: 174, gain: 238 }
/** Rows of nodes, px from the top. */
const row = { output: 60, input: 252, earth: 392 }

/** Slots as distances from the drawing's middle, px: left ones grow to the left, right ones to the right. */
const outer = 'absolute w-[calc((50%-93px)*0.9+4px)] max-w-21'
const places: Record<CircuitSlot, string> = {
  seriesR: `${outer} right-[calc(50%+71px)] top-[74px] text-right`,
  seriesC: `${outer} right-[calc(50%+77px)] top-[156px] text-right`,
  shuntR: `${outer} right-[calc(50%+91px)] top-[288px] text-right`,
  shuntC: 'absolute left-[calc(50%-16px)] w-[66px] top-[288px]',
  feedbackR: `${outer} left-[calc(50%+93px)] top-[118px]`,
  feedbackShuntedR: `${outer} left-[calc(50%+93px)] top-[166px]`,
  groundR: `${outer} left-[calc(50%+93px)] top-[288px]`,
  load: `${outer} left-[calc(50%+93px)] top-[4px]`,
}

/** With diodes the feedback's series part moves up to make room for the part that they bridge. */
const feedbackAboveDiodes = `${outer} left-[calc(50%+93px)] top-[74px]`

function description(control: CircuitDrawingProps['control'], loaded: boolean): string {
  const gainArm = {
    none: 'feedback R and ground R',
    diodes: 'feedback R, part of it bridged by two antiparallel diodes, and ground R',
    lamp: 'feedback R and a filament lamp in the place of ground R',
  }[control]
  return `Bridge oscillator. Left arm: series R and series C to the non-inverting input, shunt R and shunt C from there to the reference. Right arm: ${gainArm}, joined at the inverting input.${loaded ? ' A load hangs at the output.' : ''}`
}

export function CircuitDrawing(props: CircuitDrawingProps) {
  const { values, control, loaded = false, reference = null, limit = null } = props
  const limiting = limit !== null && limit !== 'linear' ? limit : null
  const slots = Object.entries(values) as [CircuitSlot, ReactNode][]
  return (
    <div className="relative mx-auto w-full min-w-[326px]" style={{ height }}>
      <svg
        role="img"
        aria-label={description(control, loaded)}
        width={width}
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        className="absolute left-1/2 -translate-x-1/2 fill-none stroke-ink [stroke-width:1.6]"
      >
        <NetworkArm />
        <GainArm control={control} />
        <AmplifierSymbol limit={limiting} />
        <Output loaded={loaded} single={reference !== null} />
        <Feet reference={reference} />
      </svg>
      {slots.map(([slot, content]) =>
        content === null || content === undefined ? null : (
          <div
            key={slot}
            className={slot === 'feedbackR' && control === 'diodes' ? feedbackAboveDiodes : places[slot]}
          >
            {content}
          </div>
        ),
      )}
    </div>
  )
}

function NetworkArm() {
  const { series, shuntR, shuntC } = at
  return (
    <>
      <path d={`M${at.amplifier} ${row.output}H${series}V${row.input}V270M${shuntR} 270H${shuntC}`} />
      <path d={`M${shuntR} 270V366M${shuntC} 270V366M${shuntR} 366H${shuntC}M${series} 366V${row.earth}`} />
      <Resistor x={series} y={102} />
      <Capacitor x={series} y={184} />
      <Resistor x={shuntR} y={318} />
      <Capacitor x={shuntC} y={318} />
      <Joint x={series} y={row.input} />
    </>
  )
}

function GainArm({ control }: Pick<CircuitDrawingProps, 'control'>) {
  const x = at.gain
  return (
    <>
      <path d={`M${at.amplifier} ${row.output}H${x}V${row.earth}`} />
      {control === 'diodes' ? (
        <>
          <Resistor x={x} y={100} along={20} />
          <path d={`M${x} 138H201V226H${x}M219 138V226`} />
          <Diode x={201} y={164} />
          <Diode x={219} y={184} up />
          <Resistor x={x} y={182} along={20} />
          <Joint x={x} y={138} />
          <Joint x={x} y={226} />
        </>
      ) : (
        <Resistor x={x} y={146} along={28} />
      )}
      {control === 'lamp' ? <Lamp x={x} y={318} /> : <Resistor x={x} y={318} />}
      <Joint x={x} y={row.input} />
    </>
  )
}

function AmplifierSymbol({ limit }: { limit: Exclude<Mode, 'linear'> | null }) {
  const x = at.amplifier
  const [apex, base, half] = [150, 216, 32]
  return (
    <g className={classNames(limit && 'stroke-copper')} data-limit={limit ?? undefined}>
      <path d={`M${x} ${row.output}V${apex}`} className="stroke-ink" />
      <path
        d={`M${x} ${apex}L${x - half} ${base}H${x + half}Z`}
        className={limit ? 'fill-copper-wash' : 'fill-card'}
        strokeWidth={limit ? 2.2 : undefined}
      />
      <path
        d={`M${x - 16} ${base}V${row.input}H${at.series}M${x + 16} ${base}V${row.input}H${at.gain}`}
        className="stroke-ink"
      />
      <Word x={x - 16} y={base - 6} className="fill-ink">
        +
      </Word>
      <Word x={x + 16} y={base - 6} className="fill-ink">
        −
      </Word>
      {limit && (
        <Word x={x} y={row.input + 20} className="fill-copper font-medium">
          {limitWords[limit]}
        </Word>
      )}
    </g>
  )
}

/** The load ends where both arms do: at earth, or at the reference of a single supply. */
function Output({ loaded, single }: { loaded: boolean; single: boolean }) {
  const x = at.amplifier
  return (
    <>
      <path d={`M${x} ${row.output}V31`} className="stroke-petrol" />
      {loaded && (
        <>
          <path d={`M${x + 4} 27H240V42`} />
          <path
            d={single ? 'M231 42h18' : 'M233 42h14M236 46h8M238.5 50h3'}
            strokeWidth={single ? 2.4 : undefined}
          />
          <LyingResistor x={209} y={27} />
        </>
      )}
      <circle cx={x} cy="27" r="4" className="fill-card stroke-petrol" />
      <Word x={x - 11} y={31} anchor="end" className="fill-petrol">
        output
      </Word>
      <Joint x={x} y={row.output} />
    </>
  )
}

/** What both arms end at: earth on a split supply, the reference node on a single one. */
function Feet({ reference }: { reference: string | null }) {
  if (reference === null)
    return (
      <>
        <Earth x={at.series} y={row.earth} />
        <Earth x={at.gain} y={row.earth} />
      </>
    )
  const middle = (at.series + at.gain) / 2
  return (
    <>
      <path d={`M${at.series - 20} ${row.earth}H${at.gain + 20}`} strokeWidth="2.4" />
      <Joint x={at.series} y={row.earth} />
      <Joint x={at.gain} y={row.earth} />
      <Word x={middle} y={row.earth + 18}>
        {reference}
      </Word>
    </>
  )
}
