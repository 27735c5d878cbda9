/** Symbols of the drawing after IEC 60617: resistor, capacitor, diode, lamp, earth, amplifier. Coordinates in pixels. */
import type { ReactNode } from 'react'

/** Half-sizes in pixels. */
const resistor = { across: 9, along: 23 }
const plate = { half: 15, gap: 9 }
const lampRadius = 14

interface At {
  x: number
  y: number
}

/** A resistor standing on (x, y) as its centre. */
export function Resistor({ x, y, along = resistor.along }: At & { along?: number }) {
  return (
    <rect
      x={x - resistor.across}
      y={y - along}
      width={2 * resistor.across}
      height={2 * along}
      rx="1"
      className="fill-card"
    />
  )
}

/** A resistor lying across. */
export function LyingResistor({ x, y }: At) {
  return <rect x={x - 18} y={y - 8} width="36" height="16" rx="1" className="fill-card" />
}

/** Two plates, the wire between them cut out. */
export function Capacitor({ x, y }: At) {
  const above = y - plate.gap / 2
  return (
    <>
      <rect x={x - 2} y={above} width="4" height={plate.gap} className="fill-card stroke-none" />
      <path
        d={`M${x - plate.half} ${above}h${2 * plate.half}M${x - plate.half} ${above + plate.gap}h${2 * plate.half}`}
        strokeWidth="2.4"
      />
    </>
  )
}

/** A diode conducting downwards, or upwards. */
export function Diode({ x, y, up = false }: At & { up?: boolean }) {
  const turn = up ? -1 : 1
  return (
    <>
      <path d={`M${x - 7} ${y - 6 * turn}h14l-7 ${12 * turn}z`} className="fill-card" />
      <path d={`M${x - 7} ${y + 6 * turn}h14`} strokeWidth="2" />
    </>
  )
}

/** A filament lamp: circle and cross. */
export function Lamp({ x, y }: At) {
  const arm = lampRadius * Math.SQRT1_2
  return (
    <>
      <circle cx={x} cy={y} r={lampRadius} className="fill-card" />
      <path d={`M${x - arm} ${y - arm}l${2 * arm} ${2 * arm}m0 ${-2 * arm}l${-2 * arm} ${2 * arm}`} />
    </>
  )
}

/** Earth: three bars below (x, y). */
export function Earth({ x, y }: At) {
  return <path d={`M${x - 13} ${y}h26M${x - 8} ${y + 5}h16M${x - 3.5} ${y + 10}h7`} />
}

/** Where wires join. */
export function Joint({ x, y }: At) {
  return <circle cx={x} cy={y} r="3.2" className="fill-ink stroke-none" />
}

/** Text within the drawing. */
export function Word({
  x,
  y,
  anchor = 'middle',
  className,
  children,
}: At & { anchor?: 'start' | 'middle' | 'end'; className?: string; children: ReactNode }) {
  return (
    <text x={x} y={y} textAnchor={anchor} className={`stroke-none text-xs ${className ?? 'fill-soft'}`}>
      {children}
    </text>
  )
}
