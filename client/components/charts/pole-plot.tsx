/** Poles of the linear loop in the complex plane: the right half grows, the left half dies out. */
import { useRef } from 'react'
import { poleView } from '#client/components/charts/pole-view.ts'
import { useWidth } from '#client/components/charts/use-width.ts'
import { formatQuantity } from '#shared/units/format.ts'
import type { Complex } from '#sim/types.ts'

export interface PolePlotProps {
  /** 1/s. */
  poles: readonly Complex[]
  /** CSS pixels. */
  height?: number
}

const arm = 5.5

/** A pole in words; a conjugate pair as one. */
function poleText({ re, im }: Complex): string {
  const real = formatQuantity(re, '1/s', { digits: 4, signed: true })
  return im === 0 ? real : `${real} ± j${formatQuantity(Math.abs(im), 'rad/s', { digits: 4 })}`
}

export function PolePlot({ poles, height = 190 }: PolePlotProps) {
  const box = useRef<HTMLDivElement>(null)
  const width = useWidth(box)
  const { shown, far, real, imaginary } = poleView(poles)
  const x = (re: number) => (width / 2) * (1 + re / real)
  const y = (im: number) => (height / 2) * (1 - im / imaginary)
  const told = shown.filter((pole) => pole.im >= 0)
  return (
    <div className="px-2">
      <div ref={box} data-plot className="w-full min-w-0" style={{ height }}>
        <svg
          role="img"
          aria-label={`Poles at ${told.map(poleText).join(' and ')}; right of the axis a disturbance grows, left of it dies out.`}
          width={width}
          height={height}
          className="block text-xs"
        >
          <rect x={width / 2} width={width / 2} height={height} className="fill-ok-wash" />
          <path d={`M0 ${height / 2}H${width}M${width / 2} 0V${height}`} className="stroke-line" />
          <text x={width / 2 + 8} y={height - 8} className="fill-ok">
            grows
          </text>
          <text x={width / 2 - 8} y={height - 8} textAnchor="end" className="fill-soft">
            dies out
          </text>
          {shown.map((pole, index) => (
            <path
              key={index}
              data-pole={pole.re > 0 ? 'grows' : 'dies out'}
              d={`M${x(pole.re) - arm} ${y(pole.im) - arm}l${2 * arm} ${2 * arm}m0 ${-2 * arm}l${-2 * arm} ${2 * arm}`}
              className="stroke-copper"
              strokeWidth="2"
            />
          ))}
          {told.map((pole, index) => (
            <text key={index} x={x(pole.re)} y={y(pole.im) + 22} textAnchor="middle" className="fill-ink">
              {poleText(pole)}
            </text>
          ))}
        </svg>
      </div>
      <p className="mt-2 text-sm text-soft">
        The real axis is stretched.
        {far.length > 0 &&
          ` ${far.map((pole) => poleText(pole)).join(', ')}: too fast to matter to the tone, not drawn.`}
      </p>
    </div>
  )
}
