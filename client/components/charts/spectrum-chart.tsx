/** Harmonics as stems over a logarithmic level axis relative to the fundamental. */
import { useRef } from 'react'
import {
  axisFloor,
  levelTicks,
  stemHeight,
  type LevelScale,
} from '#client/components/charts/spectrum-levels.ts'
import { useWidth } from '#client/components/charts/use-width.ts'
import { formatNumber, formatPercent, formatQuantity, thinSpace } from '#shared/units/format.ts'

/** One harmonic: its order, and its level as a ratio to the fundamental. */
export interface SpectrumStem {
  order: number
  ratio: number
}

export interface SpectrumChartProps {
  stems: readonly SpectrumStem[]
  /** Of the fundamental, Hz. */
  fundamental: number
  scale: LevelScale
  /** CSS pixels. */
  height?: number
  /** What the plot shows, for those who cannot see it. */
  label: string
}

const frame = { left: 60, right: 14, top: 14, bottom: 48 }
/** Narrower than this per harmonic, only every other one is named. */
const leastSpacing = 26

function tickLabel(level: number, scale: LevelScale): string {
  if (scale === 'percent') return formatPercent(10 ** (level / 20))
  return `${formatNumber(level)}${thinSpace}dB`
}

export function SpectrumChart({ stems, fundamental, scale, height = 260, label }: SpectrumChartProps) {
  const box = useRef<HTMLDivElement>(null)
  const width = useWidth(box)
  const floor = axisFloor(stems.map((stem) => stem.ratio))
  const plotHeight = height - frame.top - frame.bottom
  const spacing = Math.max(0, width - frame.left - frame.right) / (stems.length + 0.5)
  const every = spacing < leastSpacing ? 2 : 1
  const x = (index: number) => frame.left + (index + 0.75) * spacing
  const y = (share: number) => frame.top + (1 - share) * plotHeight
  return (
    <div ref={box} data-plot className="w-full min-w-0" style={{ height }}>
      <svg role="img" aria-label={label} width={width} height={height} className="block text-xs">
        {levelTicks(floor).map((level) => (
          <g key={level}>
            <path
              d={`M${frame.left} ${y(1 - level / floor)}H${Math.max(frame.left, width - frame.right)}`}
              className="stroke-hair"
            />
            <text
              x={frame.left - 8}
              y={y(1 - level / floor)}
              dy="0.32em"
              textAnchor="end"
              className="fill-soft"
            >
              {tickLabel(level, scale)}
            </text>
          </g>
        ))}
        {stems.map(({ order, ratio }, index) => {
          const top = y(stemHeight(ratio, floor))
          const colour = order === 1 ? 'petrol' : 'copper'
          return (
            <g key={order} data-order={order}>
              <path
                d={`M${x(index)} ${y(0)}V${top}`}
                strokeWidth="3"
                className={colour === 'petrol' ? 'stroke-petrol' : 'stroke-copper'}
              />
              <circle
                cx={x(index)}
                cy={top}
                r="4"
                className={colour === 'petrol' ? 'fill-petrol' : 'fill-copper'}
              />
              {index % every === 0 && (
                <text x={x(index)} y={y(0) + 17} textAnchor="middle" className="fill-soft">
                  {order}
                </text>
              )}
            </g>
          )
        })}
        <path
          d={`M${frame.left} ${y(0)}H${Math.max(frame.left, width - frame.right)}`}
          className="stroke-line"
        />
        <text x={(frame.left + width) / 2} y={height - 8} textAnchor="middle" className="fill-soft">
          multiples of {formatQuantity(fundamental, 'Hz', { digits: 5 })}
        </text>
      </svg>
    </div>
  )
}
